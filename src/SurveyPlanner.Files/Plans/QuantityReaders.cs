using SurveyPlanner.Files.Units;

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

/// <summary>Degrees true, or an axis of the stratum.</summary>
internal sealed class BearingReader : ValueReader<Layouts.Bearing>
{
    private const string LongAxis = "long-axis";
    private const string ShortAxis = "short-axis";

    public override string Takes => "degrees from 0 to below 360, \"long-axis\" or \"short-axis\"";

    public override Parsed<Layouts.Bearing> Read(SettingValue value, Sample sample) => value switch
    {
        SettingValue.Text { Value: LongAxis } => Parsed.Ok<Layouts.Bearing>(new Layouts.Bearing.LongAxis()),
        SettingValue.Text { Value: ShortAxis } => Parsed.Ok<Layouts.Bearing>(new Layouts.Bearing.ShortAxis()),
        SettingValue.Whole whole => Degrees(whole.Value, sample),
        SettingValue.Number number when double.IsFinite(number.Value) => Degrees(number.Value, sample),
        SettingValue.Text text when DecimalText.Read(text.Value.TrimEnd('°')) is { IsGood: true } number =>
            Parsed.Bad<Layouts.Bearing>($"write {sample.With(DecimalText.Write(number.Good))} without quotes: degrees are a plain number"),
        SettingValue.Text text => Parsed.Bad<Layouts.Bearing>(
            $"{Quoted.Short(text.Value)} is not {Takes}{Spelling.Hint(text.Value, [LongAxis, ShortAxis])}"),
        _ => WrongType(value, sample),
    };

    public override string Write(Layouts.Bearing value) => value switch
    {
        Layouts.Bearing.LongAxis => Quoted.Text(LongAxis),
        Layouts.Bearing.ShortAxis => Quoted.Text(ShortAxis),
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

/// <summary>A sum of money.</summary>
internal sealed class MoneyReader : ValueReader<Money>
{
    public override string Takes => "a sum of money with its currency, more than 0";

    public override bool IsText => true;

    public override Parsed<Money> Read(SettingValue value, Sample sample) => value switch
    {
        SettingValue.Text text => QuantityText.ReadMoney(text.Value, sample.ToString()).Then(money => money.Amount > 0
            ? Parsed.Ok(money)
            : Parsed.Bad<Money>($"{value.Shown} is not more than 0: write {sample}")),
        _ => WrongType(value, sample),
    };

    public override string Write(Money value) => Quoted.Text($"{DecimalText.Write(value.Amount)} {value.Currency}");
}

/// <summary>An encounter rate.</summary>
internal sealed class EncounterRateReader : ValueReader<GivenRate>
{
    public override string Takes => "detections per length (or per visit), more than 0";

    public override bool IsText => true;

    public override Parsed<GivenRate> Read(SettingValue value, Sample sample) => value switch
    {
        SettingValue.Text text => QuantityText.ReadEncounterRate(text.Value, sample.ToString()).Then(rate => rate.Value > 0
            ? Parsed.Ok(rate)
            : Parsed.Bad<GivenRate>($"{value.Shown} is not more than 0: write {sample}")),
        _ => WrongType(value, sample),
    };

    public override string Write(GivenRate value) => Quoted.Text($"{DecimalText.Write(value.Value)} {(value.PerVisit ? "/visit" : "/km")}");
}
