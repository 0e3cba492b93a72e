using System.Collections.Immutable;
using System.Globalization;

namespace SurveyPlanner.Layouts;

/// <summary>
/// Names for transects that old GPS units take: capitals and digits, at most 6. With several strata a letter tells the stratum (A001, B001);
/// one stratum, or more than the letters or numbers hold, count through as T0001.
/// </summary>
internal sealed class TransectIds
{
    // I and O are left out: on a wet notebook they are read as 1 and 0.
    private const string Letters = "ABCDEFGHJKLMNPQRSUVWXYZ";
    private const int MaxLettered = 999;

    private readonly ImmutableArray<int> _counts;
    private readonly bool _lettered;

    public TransectIds(ImmutableArray<int> transectsByStratum)
    {
        _counts = transectsByStratum;
        _lettered = _counts.Length > 1 && _counts.Length <= Letters.Length && _counts.All(count => count <= MaxLettered);
    }

    /// <param name="stratum">Index of the stratum.</param>
    /// <param name="transect">Index of the transect in it.</param>
    public string Of(int stratum, int transect)
    {
        if (_lettered)
        {
            return string.Create(CultureInfo.InvariantCulture, $"{Letters[stratum]}{transect + 1:000}");
        }

        var number = _counts.Take(stratum).Sum() + transect + 1;
        return string.Create(CultureInfo.InvariantCulture, $"T{number:0000}");
    }
}
