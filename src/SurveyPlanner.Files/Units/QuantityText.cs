using System.Text.RegularExpressions;

namespace SurveyPlanner.Files.Units;

/// <summary>
/// Text quantities of the plan file: a number, and the unit it is in. The space between them may be left out.
/// </summary>
internal static partial class QuantityText
{
    /// <summary>Reads <c>2.5 km</c>, <c>600 ft</c>, <c>100 kn</c>, <c>6 h</c> into the table's base unit.</summary>
    /// <param name="text">The text.</param>
    /// <param name="table">The units allowed.</param>
    /// <param name="sample">How a right one is written, for messages, such as <c>layout.spacing = "5 km"</c>.</param>
    public static Parsed<double> Read(string text, UnitTable table, string sample)
    {
        var (number, symbol) = Split(text);
        if (symbol.Length == 0 && number.Length > 0)
        {
            return DecimalText.Read(number).Then(_ => Parsed.Bad<double>(MissingUnit(table, sample)));
        }

        if (table.Find(symbol) is not { } unit)
        {
            return Parsed.Bad<double>(UnknownUnit(text, number, symbol, table, sample));
        }

        return ReadNumber(text, number, sample)
            .Then(value => double.IsFinite(value * unit.InBaseUnits)
                ? Parsed.Ok(value * unit.InBaseUnits)
                : Parsed.Bad<double>($"{Quoted.Short(text)} is no finite number"));
    }

    /// <summary>Reads a sum of money such as <c>480 EUR</c>: the currency is any three capital letters (the form of ISO 4217).</summary>
    public static Parsed<Money> ReadMoney(string text, string sample)
    {
        var (number, currency) = Split(text);
        return Currency().IsMatch(currency)
            ? ReadNumber(text, number, sample).Then(amount => Parsed.Ok(new Money(amount, currency)))
            : Parsed.Bad<Money>($"write {sample}: a sum of money is a number and the three capital letters of its currency");
    }

    /// <summary>Reads what something costs per time, length or piece, such as <c>480 EUR/day</c>.</summary>
    public static Parsed<MoneyRate> ReadMoneyRate(string text, string sample)
    {
        var slash = text.IndexOf('/', StringComparison.Ordinal);
        var per = slash < 0 ? "" : text[(slash + 1)..].Trim();
        return MoneyRate.Bases.Contains(per)
            ? ReadMoney(text[..slash], sample).Then(money => Parsed.Ok(new MoneyRate(money, per)))
            : Parsed.Bad<MoneyRate>($"write {sample}: a rate ends in / and one of {WordList.Or(MoneyRate.Bases)}");
    }

    /// <summary>Reads an encounter rate: <c>0.8 /km</c> (any length) or <c>1.5 /visit</c>.</summary>
    public static Parsed<GivenRate> ReadEncounterRate(string text, string sample)
    {
        var (number, unit) = Split(text);
        var basis = unit.StartsWith('/') ? unit[1..].Trim() : "";
        if (basis == "visit")
        {
            return ReadNumber(text, number, sample).Then(value => Parsed.Ok(new GivenRate(value, PerVisit: true)));
        }

        return UnitTable.Length.Find(basis) is { } length
            ? ReadNumber(text, number, sample).Then(value => Parsed.Ok(new GivenRate(value * 1000 / length.InBaseUnits, PerVisit: false)))
            : Parsed.Bad<GivenRate>($"write {sample}: an encounter rate is detections per length of line (/{WordList.Or(UnitTable.Length.Units.Select(u => u.Symbol))}) or, at points, per visit (/visit)");
    }

    /// <summary>The sentence for a number that stands alone where a unit is needed.</summary>
    public static string MissingUnit(UnitTable table, string sample) => $"write {sample}: {table.Noun} needs its unit";

    private static Parsed<double> ReadNumber(string text, string number, string sample)
        => number.Length == 0 ? Parsed.Bad<double>($"{Quoted.Short(text)} has no number: write {sample}") : DecimalText.Read(number);

    private static string UnknownUnit(string text, string number, string symbol, UnitTable table, string sample)
    {
        if (number.Length == 0)
        {
            return $"{Quoted.Short(text)} is not {table.Noun}: write {sample}";
        }

        var guess = table.Guess(symbol) is { } meant ? $": write {Quoted.Text($"{number} {meant}")}" : "";
        return $"{Quoted.Short(symbol)} is not a unit of {table.Noun[2..]} here{guess} (the units are {table.Choices})";
    }

    private static (string Number, string Unit) Split(string text)
    {
        var match = NumberThenUnit().Match(text);
        return (match.Groups["number"].Value, match.Groups["unit"].Value.Trim());
    }

    [GeneratedRegex(@"^\s*(?<number>[+\-]?[0-9.,]*(?:[eE][+\-]?[0-9]+)?)(?<unit>.*)$", RegexOptions.Singleline)]
    private static partial Regex NumberThenUnit();

    [GeneratedRegex("^[A-Z]{3}$")]
    private static partial Regex Currency();
}

/// <summary>A sum of money.</summary>
internal readonly record struct Money(double Amount, string Currency);

/// <summary>Money per time, length or piece.</summary>
internal readonly record struct MoneyRate(Money Money, string Per)
{
    public static readonly string[] Bases = ["h", "day", "km", "nmi", "mi", "line", "point", "visit"];
}

/// <summary>Detections per kilometre of line, or per visit to a point.</summary>
internal readonly record struct GivenRate(double Value, bool PerVisit);
