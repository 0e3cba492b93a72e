using System.Collections.Immutable;
using SurveyPlanner.Files.Units;

namespace SurveyPlanner.Files.Plans;

/// <summary>A value as TOML has it, before anyone asks what it means.</summary>
/// <param name="Raw">As it was written.</param>
internal abstract record SettingValue(string Raw)
{
    /// <summary>How a message shows it.</summary>
    public virtual string Shown => Quoted.Plain(Raw);

    internal sealed record Text(string Value, string Raw) : SettingValue(Raw)
    {
        public override string Shown => Quoted.Short(Value);
    }

    internal sealed record Whole(long Value, string Raw) : SettingValue(Raw);

    /// <summary>A number with a fraction or exponent, infinity or not-a-number.</summary>
    internal sealed record Number(double Value, string Raw) : SettingValue(Raw);

    internal sealed record List(ImmutableArray<SettingValue> Items, string Raw) : SettingValue(Raw);

    internal sealed record YesNo(bool Value, string Raw) : SettingValue(Raw);

    /// <summary>A date or a time: no key takes one.</summary>
    internal sealed record Other(string Raw) : SettingValue(Raw);

    /// <summary>The key is there, but its line could not be read; that has been said already.</summary>
    internal sealed record Unreadable() : SettingValue("");
}

/// <summary>One key with its value, and where both stand.</summary>
internal sealed record Setting(KeyPath Path, SettingValue Value, Place KeyPlace, Place ValuePlace);

/// <summary>A table header.</summary>
internal sealed record TableHeader(KeyPath Path, Place Place);

/// <summary>The file as TOML: its keys in file order, its table headers, and the last line (where something missing is said to be missing).</summary>
internal sealed record PlanSyntax(ImmutableArray<Setting> Settings, ImmutableArray<TableHeader> Tables, int LastLine);
