using SurveyPlanner.Files.Units;
using SurveyPlanner.Layouts;

namespace SurveyPlanner.Files.Plans;

/// <summary>A length above 0 (or from 0 on), in metres; nothing on Earth is longer than half its girth.</summary>
internal sealed class LengthReader(bool zeroIsAllowed = false) : ValueReader<double>
{
    /// <summary>No two places are farther apart: pole to pole is 20 004 km on the WGS 84 ellipsoid.</summary>
    private const double LongestMetres = 20_004_000;

    public override string Takes => zeroIsAllowed ? "a length with its unit, 0 or more" : "a length with its unit, more than 0";

    public override bool IsText => true;

    public override Parsed<double> Read(SettingValue value, Sample sample) => value switch
    {
        SettingValue.Text text => QuantityText.Read(text.Value, UnitTable.Length, sample.ToString()).Then(metres => InRange(metres, value, sample)),
        SettingValue.Whole or SettingValue.Number => Parsed.Bad<double>(QuantityText.MissingUnit(UnitTable.Length, OwnNumber(value, sample).ToString())),
        _ => WrongType(value, sample),
    };

    public override string Write(double value) => Quoted.Text(DecimalText.Write(value) + " m");

    private Parsed<double> InRange(double metres, SettingValue value, Sample sample) => metres switch
    {
        0 when zeroIsAllowed => Parsed.Ok(metres),
        <= 0 => Parsed.Bad<double>($"{value.Shown} is not more than 0: write {sample}"),
        > LongestMetres => Parsed.Bad<double>($"{value.Shown} is longer than any distance on Earth: write {sample}"),
        _ => Parsed.Ok(metres),
    };

    /// <summary>The user's own number with the sample's unit, where that makes sense.</summary>
    private static Sample OwnNumber(SettingValue value, Sample sample)
    {
        var unit = sample.Value.Trim('"').Split(' ')[^1];
        return DecimalText.Read(value.Raw) is { IsGood: true, Value: > 0 } ? sample.With(Quoted.Text($"{value.Raw} {unit}")) : sample;
    }
}

/// <summary>
/// The name of an attribute that holds lengths, with their unit: <c>gap in km</c>. Where the name is a unit or ends in one (<c>km</c>, <c>gap_km</c>),
/// that is the unit.
/// </summary>
internal sealed class LengthFieldReader : ValueReader<LengthField>
{
    private const string In = " in ";

    public override string Takes => "an attribute and its unit in quotes";

    public override bool IsText => true;

    public override Parsed<LengthField> Read(SettingValue value, Sample sample)
    {
        if (value is not SettingValue.Text { Value: var text })
        {
            return WrongType(value, sample);
        }

        var cut = text.LastIndexOf(In, StringComparison.Ordinal);
        var (name, unit) = cut > 0 ? (text[..cut].Trim(), text[(cut + In.Length)..].Trim()) : (text.Trim(), text.Trim().Split('_')[^1]);
        return name.Length > 0 && UnitTable.Length.Find(unit) is { } found
            ? Parsed.Ok(new LengthField(name, found.InBaseUnits))
            : Parsed.Bad<LengthField>($"{Quoted.Short(text)} does not say in which unit the attribute is: write {sample}");
    }

    public override string Write(LengthField value) => Quoted.Text($"{value.Name}{In}{UnitTable.Length.Units.First(unit => unit.InBaseUnits == value.MetresPerUnit).Symbol}");
}

/// <summary>Degrees true, or an axis of the stratum.</summary>
internal sealed class BearingReader : ValueReader<Layouts.Bearing>
{
    private const string LongAxis = "long-axis";
    private const string ShortAxis = "short-axis";
    private const string Random = "random";
    private const string Along = "along ";

    public override string Takes => "degrees from 0 to below 360, \"long-axis\", \"short-axis\", \"along FILE\" or, for segments, \"random\"";

    public override Parsed<Layouts.Bearing> Read(SettingValue value, Sample sample) => value switch
    {
        SettingValue.Text { Value: LongAxis } => Parsed.Ok<Layouts.Bearing>(new Layouts.Bearing.LongAxis()),
        SettingValue.Text { Value: ShortAxis } => Parsed.Ok<Layouts.Bearing>(new Layouts.Bearing.ShortAxis()),
        SettingValue.Text { Value: Random } => Parsed.Ok<Layouts.Bearing>(new Layouts.Bearing.Random()),
        SettingValue.Text text when text.Value.StartsWith(Along, StringComparison.Ordinal) && text.Value.Trim().Length > Along.Length =>
            Parsed.Ok<Layouts.Bearing>(new Layouts.Bearing.AcrossFile(text.Value[Along.Length..].Trim())),
        SettingValue.Whole whole => Degrees(whole.Value, sample),
        SettingValue.Number number when double.IsFinite(number.Value) => Degrees(number.Value, sample),
        SettingValue.Text text when DecimalText.Read(text.Value.TrimEnd('°')) is { IsGood: true } number =>
            Parsed.Bad<Layouts.Bearing>($"write {sample.With(DecimalText.Write(number.Good))} without quotes: degrees are a plain number"),
        SettingValue.Text text => Parsed.Bad<Layouts.Bearing>(
            $"{Quoted.Short(text.Value)} is not {Takes}{Spelling.Hint(text.Value, [LongAxis, ShortAxis, Random])}"),
        _ => WrongType(value, sample),
    };

    public override string Write(Layouts.Bearing value) => value switch
    {
        Layouts.Bearing.LongAxis => Quoted.Text(LongAxis),
        Layouts.Bearing.ShortAxis => Quoted.Text(ShortAxis),
        Layouts.Bearing.Random => Quoted.Text(Random),
        Layouts.Bearing.AcrossFile across => Quoted.Text(Along + across.Path),
        Layouts.Bearing.Degrees degrees => DecimalText.Write(degrees.Value),
        _ => throw new ArgumentOutOfRangeException(nameof(value), value, "a bearing without a word"),
    };

    private static Parsed<Layouts.Bearing> Degrees(double degrees, Sample sample)
    {
        if (degrees is >= 0 and < 360)
        {
            return Parsed.Ok<Layouts.Bearing>(new Layouts.Bearing.Degrees(degrees));
        }

        var shown = DecimalText.Write(degrees);
        if (Math.Abs(degrees) > 3600)
        {
            return Parsed.Bad<Layouts.Bearing>($"a bearing runs from 0 to below 360 degrees, {shown} is far outside: write {sample}");
        }

        // "0.0" and not "-0": adding zero drops the sign.
        var within = DecimalText.Write((((degrees % 360) + 360) % 360) + 0.0);
        return Parsed.Bad<Layouts.Bearing>($"a bearing runs from 0 to below 360 degrees, {shown} does not: {sample.With(within)} is the same direction");
    }
}

/// <summary>A quantity above 0 that is written as text, with its unit.</summary>
/// <param name="takes">What it takes, in words.</param>
/// <param name="read">Reads the text; its second argument is a sample for messages.</param>
/// <param name="amount">The figure in it, for the test that it is above 0.</param>
/// <param name="write">The text of one fixed form.</param>
internal sealed class QuantityReader<T>(string takes, Func<string, string, Parsed<T>> read, Func<T, double> amount, Func<T, string> write) : ValueReader<T>
{
    public override string Takes => takes;

    public override bool IsText => true;

    public override Parsed<T> Read(SettingValue value, Sample sample) => value switch
    {
        SettingValue.Text text => read(text.Value, sample.ToString()).Then(quantity => amount(quantity) > 0
            ? Parsed.Ok(quantity)
            : Parsed.Bad<T>($"{value.Shown} is not more than 0: write {sample}")),
        _ => WrongType(value, sample),
    };

    public override string Write(T value) => Quoted.Text(write(value));
}
