using System.Collections.Immutable;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>
/// Collects what was mended and what the user should look at. A file with a thousand outlines of one fault gets one notice that names
/// the first few places, not a thousand.
/// </summary>
internal sealed class RepairLog
{
    private const int NamedPlaces = 3;

    private readonly List<Entry> _entries = [];
    private readonly Dictionary<string, Entry> _byDeed = [];

    /// <summary>Notes that something was mended.</summary>
    /// <param name="deed">What was done, the same words for every place, such as <c>left out repeated points</c>.</param>
    /// <param name="place">Where, with figures that belong to this place alone.</param>
    /// <param name="areaChangeSquareMetres">By how much the area changed.</param>
    public void Repair(string deed, string place, double areaChangeSquareMetres) => Find(NoticeKind.Repair, deed).Add(place, areaChangeSquareMetres);

    /// <summary>Notes that something at a place should be looked at.</summary>
    public void Warn(string what, string place) => Find(NoticeKind.Warning, what).Add(place, 0);

    /// <summary>Notes something about the whole file.</summary>
    public void Warn(string what) => Find(NoticeKind.Warning, what);

    public void Add(IEnumerable<Notice> notices)
    {
        foreach (var notice in notices)
        {
            Find(notice.Kind, notice.Message).Verbatim = true;
        }
    }

    public ImmutableArray<Notice> ToNotices() => [.. _entries.Select(entry => entry.ToNotice())];

    private Entry Find(NoticeKind kind, string words)
    {
        if (!_byDeed.TryGetValue(words, out var entry))
        {
            entry = new Entry(kind, words);
            _byDeed.Add(words, entry);
            _entries.Add(entry);
        }

        return entry;
    }

    private sealed class Entry(NoticeKind kind, string words)
    {
        private readonly List<string> _places = [];
        private int _count;
        private double _areaChange;

        public bool Verbatim { get; set; }

        public void Add(string place, double areaChange)
        {
            _count++;
            _areaChange += areaChange;
            if (_places.Count < NamedPlaces)
            {
                _places.Add(place);
            }
        }

        public Notice ToNotice()
        {
            if (Verbatim || _count == 0)
            {
                return new Notice(kind, words);
            }

            var places = string.Join("; ", _places) + (_count > NamedPlaces ? $"; and {_count - NamedPlaces} more places" : "");
            return new Notice(kind, kind == NoticeKind.Repair
                ? $"{words} ({places}); this changed the area by {Wording.SignedArea(_areaChange)}"
                : $"{words} ({places})");
        }
    }
}
