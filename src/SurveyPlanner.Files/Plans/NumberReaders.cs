using System.Globalization;
using SurveyPlanner.Files.Units;

namespace SurveyPlanner.Files.Plans;

/// <summary>True or false, without quotes.</summary>
internal sealed class YesNoReader : ValueReader<bool>
{
    public override string Takes => "true or false";

    public override Parsed<bool> Read(SettingValue value, Sample sample) => value switch
    {
        SettingValue.YesNo truth => Parsed.Ok(truth.Value),
        SettingValue.Text { Value: "true" or "false" } text => Parsed.Bad<bool>($"write {sample.With(text.Value)} without quotes"),
        _ => WrongType(value, sample),
    };

    public override string Write(bool value) => value ? "true" : "false";
}

/// <summary>A whole number in a range.</summary>
/// <param name="min">Least.</param>
/// <param name="max">Greatest.</param>
internal sealed class WholeReader(long min, long max) : ValueReader<long>
{
    public override string Takes => string.Create(CultureInfo.InvariantCulture, $"a whole number from {min} to {max}");

    public override Parsed<long> Read(SettingValue value, Sample sample) => value switch
    {
        SettingValue.Whole whole when whole.Value >= min && whole.Value <= max => Parsed.Ok(whole.Value),
        _ => WrongType(value, sample),
    };

    public override string Write(long value) => value.ToString(CultureInfo.InvariantCulture);
}

/// <summary>A plain number in a range, written without quotes.</summary>
/// <param name="takes">What it takes, in words.</param>
/// <param name="isAllowed">Whether a finite number is allowed.</param>
internal class NumberReader(string takes, Func<double, bool> isAllowed) : ValueReader<double>
{
    public override string Takes => takes;

    public override Parsed<double> Read(SettingValue value, Sample sample) => value switch
    {
        SettingValue.Whole whole => InRange(whole.Value, value, sample),
        SettingValue.Number number when double.IsFinite(number.Value) => InRange(number.Value, value, sample),
        SettingValue.Text text => InQuotes(text, sample),
        _ => WrongType(value, sample),
    };

    public override string Write(double value)
    {
        var text = DecimalText.Write(value);
        return text.AsSpan().ContainsAny(".E") ? text : text + ".0";
    }

    protected bool IsAllowed(double number) => isAllowed(number);

    /// <summary>What to say of a finite number that is not allowed.</summary>
    protected virtual string OutOfRange(double number, SettingValue value, Sample sample) => $"{value.Shown} is not {Takes}: write {sample}";

    private Parsed<double> InRange(double number, SettingValue value, Sample sample)
        => IsAllowed(number) ? Parsed.Ok(number) : Parsed.Bad<double>(OutOfRange(number, value, sample));

    private Parsed<double> InQuotes(SettingValue.Text text, Sample sample)
    {
        var number = DecimalText.Read(text.Value);
        if (number.IsGood && IsAllowed(number.Good))
        {
            return Parsed.Bad<double>($"write {sample.With(Write(number.Good))} without quotes: it is a plain number");
        }

        return text.Value.Contains(',', StringComparison.Ordinal) ? Parsed.Bad<double>(number.Complaint!) : WrongType(text, sample);
    }
}

/// <summary>A share of one: coefficients of variation, probabilities. Percent is the slip that everybody makes.</summary>
/// <param name="noun">What it is, with its article.</param>
/// <param name="range">What is allowed, in words.</param>
/// <param name="isAllowed">What is allowed.</param>
/// <param name="zeroAdvice">Why it cannot be 0.</param>
internal sealed class ShareReader(string noun, string range, Func<double, bool> isAllowed, string zeroAdvice = "")
    : NumberReader($"{noun}: a number {range}", isAllowed)
{
    protected override string OutOfRange(double number, SettingValue value, Sample sample) => number switch
    {
        0 => $"0 is no {noun[2..]} to ask for: {zeroAdvice}; write {sample}",
        >= 2 and <= 100 when IsAllowed(number / 100) => $"{value.Shown} is not {Takes}: percent meant? write {sample.With(DecimalText.Write(number / 100))}",
        > 100 => $"{value.Shown} is not {Takes}: percent meant? even then it is more than 1, a usual one is {sample}",
        _ => base.OutOfRange(number, value, sample),
    };
}
