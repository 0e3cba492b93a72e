using SurveyPlanner.Files.Units;

namespace SurveyPlanner.Files.Plans;

/// <summary>
/// The command line's <c>--set key=value</c>. The shell has taken the quotes away, so <c>stratum.inner bay.kind=zigzag</c> and
/// <c>layout.spacing=4 km</c> are read as they were meant.
/// </summary>
internal static class SetOverrides
{
    private const string StratumPrefix = "stratum.";

    /// <summary>The settings of all overrides; of the same key the last one counts.</summary>
    public static IReadOnlyList<Setting> Read(IEnumerable<string> overrides, List<Problem> problems)
    {
        var settings = new Dictionary<KeyPath, Setting>();
        foreach (var text in overrides)
        {
            var equals = EqualsSign(text);
            var (key, value) = equals < 0 ? (text, "") : (text[..equals].Trim(), text[(equals + 1)..].Trim());
            if (key.Length == 0 || value.Length == 0)
            {
                problems.Add(Place.Set.Problem($"{Quoted.Short(text)} is no key=value: write --set layout.spacing=\"4 km\""));
                continue;
            }

            var path = Path(key);
            settings[path] = new Setting(path, Value(value), Place.Set, Place.Set);
        }

        return [.. settings.Values];
    }

    /// <summary>The file's settings with the overrides in place of those that answer the same question.</summary>
    public static IReadOnlyList<Setting> Apply(IReadOnlyList<Setting> overrides, IEnumerable<Setting> fromFile)
    {
        var paths = overrides.Select(setting => setting.Path).ToHashSet();
        var groups = overrides.Select(GroupOf).Where(group => group.Group != KeyGroup.None).ToHashSet();
        return [.. fromFile.Where(setting => !paths.Contains(setting.Path) && !groups.Contains(GroupOf(setting))), .. overrides];
    }

    private static (KeyPath Table, KeyGroup Group) GroupOf(Setting setting)
    {
        var segments = setting.Path.Segments;
        return (setting.Path.Parent, PlanKeys.Find(segments[0], segments[^1])?.Group ?? KeyGroup.None);
    }

    private static KeyPath Path(string key)
    {
        var lastDot = key.LastIndexOf('.');
        if (key.StartsWith(StratumPrefix, StringComparison.Ordinal) && lastDot > StratumPrefix.Length)
        {
            return new KeyPath(["stratum", Unquoted(key[StratumPrefix.Length..lastDot]), key[(lastDot + 1)..]]);
        }

        return new KeyPath([.. key.Split('.')]);
    }

    private static SettingValue Value(string text) => TomlReader.Literal(text) ?? new SettingValue.Text(text, text);

    /// <summary>The first equals sign outside quotes, or -1.</summary>
    private static int EqualsSign(string text)
    {
        var inQuotes = false;
        for (var i = 0; i < text.Length; i++)
        {
            if (text[i] == '"')
            {
                inQuotes = !inQuotes;
            }
            else if (text[i] == '=' && !inQuotes)
            {
                return i;
            }
        }

        return -1;
    }

    private static string Unquoted(string text)
        => text.Length >= 2 && text[0] == text[^1] && text[0] is '"' or '\''
            ? (TomlReader.Literal(text) as SettingValue.Text)?.Value ?? text[1..^1]
            : text;
}
