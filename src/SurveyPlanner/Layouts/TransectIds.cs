using System.Collections.Immutable;
using System.Globalization;

namespace SurveyPlanner.Layouts;

/// <summary>
/// Names for transects that old GPS units take: capitals and digits, at most 6. With several strata a letter tells the stratum (A001, B001);
/// one stratum, or more than the letters or numbers hold, count through as T0001. Spare points of a reserve are named apart: A-R01, R0001.
/// </summary>
internal sealed class TransectIds
{
    // I and O are left out: on a wet notebook they are read as 1 and 0.
    private const string Letters = "ABCDEFGHJKLMNPQRSUVWXYZ";
    private const int MaxLettered = 999;
    private const int PerLetter = 100_000;

    private readonly ImmutableArray<int> _counts;
    private readonly ImmutableArray<int> _reserves;
    private readonly bool _lettered;

    public TransectIds(ImmutableArray<int> transectsByStratum, ImmutableArray<int> reservesByStratum)
    {
        RefuseMore(transectsByStratum, 'T', 'Z', "transects");
        RefuseMore(reservesByStratum, 'R', 'S', "spare points");
        (_counts, _reserves) = (transectsByStratum, reservesByStratum);
        _lettered = _counts.Length > 1 && _counts.Length <= Letters.Length && _counts.Concat(_reserves).All(count => count <= MaxLettered);
    }

    /// <param name="stratum">Index of the stratum.</param>
    /// <param name="transect">Index of the transect in it.</param>
    public string Of(int stratum, int transect)
        => _lettered
            ? string.Create(CultureInfo.InvariantCulture, $"{Letters[stratum]}{transect + 1:000}")
            : Numbered('T', _counts, stratum, transect);

    /// <param name="stratum">Index of the stratum.</param>
    /// <param name="point">Index of the spare point in its reserve.</param>
    public string OfReserve(int stratum, int point)
        => _lettered
            ? string.Create(CultureInfo.InvariantCulture, $"{Letters[stratum]}-R{point + 1:00}")
            : Numbered('R', _reserves, stratum, point);

    /// <summary>Counted through all strata; each full hundred thousand takes the next letter, so that six characters hold it.</summary>
    private static string Numbered(char letter, ImmutableArray<int> counts, int stratum, int index)
    {
        var number = counts.Take(stratum).Sum() + index + 1;
        return number < PerLetter
            ? string.Create(CultureInfo.InvariantCulture, $"{letter}{number:0000}")
            : string.Create(CultureInfo.InvariantCulture, $"{(char)(letter + (number / PerLetter))}{number % PerLetter:00000}");
    }

    private static void RefuseMore(ImmutableArray<int> counts, char first, char last, string what)
    {
        var most = ((last - first + 1) * PerLetter) - 1;
        if (counts.Sum(count => (long)count) > most)
        {
            throw new InputException(string.Create(CultureInfo.InvariantCulture, $"the whole survey has more than {most} {what}, more than there are names for; ask for fewer"));
        }
    }
}
