using System.Collections.Immutable;

namespace SurveyPlanner.Files.Units;

/// <summary>One unit and how many base units it holds.</summary>
internal sealed record Unit(string Symbol, double InBaseUnits);

/// <summary>The units that one physical quantity may be written in; the first is its base unit.</summary>
/// <param name="Noun">What it measures, with its article, for messages.</param>
/// <param name="Units">The units.</param>
/// <param name="OtherSpellings">Spellings that people use and we do not read, and the unit each means.</param>
internal sealed record UnitTable(string Noun, ImmutableArray<Unit> Units, ImmutableDictionary<string, string> OtherSpellings)
{
    /// <summary>
    /// Lengths in metres. Foot, yard and mile are the international ones of 1959 (0.3048 m, 3 ft, 5280 ft), the nautical mile that of
    /// 1929 (1852 m), all exact: NIST Special Publication 811, appendix B.
    /// </summary>
    public static readonly UnitTable Length = Create(
        "a length",
        "nm NM M sm=nmi; miles mile=mi; feet foot ' =ft; yards yard yds=yd; metres meters metre meter=m; kms kilometres kilometers kilometre kilometer=km",
        ("m", 1), ("km", 1000), ("ft", 0.3048), ("yd", 0.9144), ("mi", 1609.344), ("nmi", 1852));

    /// <summary>Speeds in metres per second; a knot is one nautical mile an hour.</summary>
    public static readonly UnitTable Speed = Create(
        "a speed",
        "kt kts knots knot=kn; kmh kph km/hr=km/h; mi/h=mph; mps=m/s",
        ("m/s", 1), ("km/h", 1000.0 / 3600), ("kn", 1852.0 / 3600), ("mph", 1609.344 / 3600));

    /// <summary>Times in seconds.</summary>
    public static readonly UnitTable Time = Create(
        "a time",
        "hr hrs hour hours=h; mins minute minutes=min; sec secs second seconds=s; d days=day",
        ("s", 1), ("min", 60), ("h", 3600), ("day", 86400));

    /// <summary>The symbols as a list for messages: <c>m, km or ft</c>.</summary>
    public string Choices => WordList.Or(Units.Select(unit => unit.Symbol));

    public Unit? Find(string symbol) => Units.FirstOrDefault(unit => unit.Symbol == symbol);

    /// <summary>The symbol that was probably meant, or null.</summary>
    public string? Guess(string symbol)
    {
        var bare = symbol.TrimEnd('.');
        return OtherSpellings.GetValueOrDefault(bare)
               ?? OtherSpellings.GetValueOrDefault(bare.ToLowerInvariant())
               ?? Units.FirstOrDefault(unit => unit.Symbol.Equals(bare, StringComparison.OrdinalIgnoreCase))?.Symbol;
    }

    private static UnitTable Create(string noun, string otherSpellings, params (string Symbol, double InBaseUnits)[] units)
    {
        var spellings = ImmutableDictionary.CreateBuilder<string, string>();
        foreach (var group in otherSpellings.Split(';', StringSplitOptions.TrimEntries))
        {
            var sides = group.Split('=', StringSplitOptions.TrimEntries);
            foreach (var spelling in sides[0].Split(' '))
            {
                spellings.Add(spelling, sides[1]);
            }
        }

        return new UnitTable(noun, [.. units.Select(unit => new Unit(unit.Symbol, unit.InBaseUnits))], spellings.ToImmutable());
    }
}
