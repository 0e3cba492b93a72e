using System.Collections.Immutable;
using System.Reflection;
using System.Runtime.CompilerServices;
using ArchUnitNET.Loader;

namespace SurveyPlanner.Tests.Architecture;

/// <summary>The arrows of the design point one way, values do not change, and the core touches nothing outside itself.</summary>
public class ArchitectureTests
{
    /// <summary>Each folder of the core, and the folders it may use. Only PlanSurvey and its values (the root) see all.</summary>
    private static readonly ImmutableDictionary<string, string[]> MayUse = new Dictionary<string, string[]>
    {
        ["Numerics"] = [],
        ["Regions"] = ["Numerics"],
        ["Layouts"] = ["Numerics", "Regions"],
        ["Coverage"] = ["Numerics", "Regions", "Layouts"],
        ["Pilots"] = ["Numerics"],
        ["Effort"] = ["Numerics", "Pilots"],
    }.ToImmutableDictionary();

    /// <summary>Values of the root that any folder may use.</summary>
    private static readonly string[] RootValues =
    [
        "SurveyPlanner.Problem", "SurveyPlanner.InputException", "SurveyPlanner.Notice", "SurveyPlanner.NoticeKind", "SurveyPlanner.ChoiceWord",
    ];

    private static readonly System.Reflection.Assembly Core = typeof(PlanSurvey).Assembly;

    private static readonly ArchUnitNET.Domain.Architecture Loaded = new ArchLoader().LoadAssemblies(Core).Build();

    [Fact]
    public void Folders_of_the_core_use_only_those_before_them()
    {
        var wrong =
            from type in Loaded.Types
            let folder = Folder(type.FullName)
            where folder is not null && folder.Length > 0
            from target in type.Dependencies.Select(dependency => dependency.Target.FullName).Distinct()
            let used = Folder(target)
            where used is not null && used != folder
            let allowed = used.Length > 0 ? MayUse[folder].Contains(used) : RootValues.Any(value => target.StartsWith(value, StringComparison.Ordinal))
            where !allowed
            select $"{type.FullName} uses {target}";
        Assert.Empty(wrong.Distinct());
    }

    [Fact]
    public void Every_folder_of_the_core_has_its_place_in_the_list()
    {
        var folders = Loaded.Types.Select(type => Folder(type.FullName)).OfType<string>().Where(folder => folder.Length > 0).Distinct();
        Assert.Empty(folders.Except(MayUse.Keys));
    }

    [Theory]
    [InlineData("System.IO.File")]
    [InlineData("System.IO.Directory")]
    [InlineData("System.IO.Stream")]
    [InlineData("System.Console")]
    [InlineData("System.DateTime")]
    [InlineData("System.DateTimeOffset")]
    [InlineData("System.TimeProvider")]
    [InlineData("System.Diagnostics.Stopwatch")]
    [InlineData("System.Random")]
    [InlineData("System.Environment")]
    [InlineData("System.Net.")]
    public void The_core_reads_nothing_prints_nothing_and_knows_no_clock(string forbidden)
    {
        var users =
            from type in Loaded.Types
            where Folder(type.FullName) is not null
            from dependency in type.Dependencies
            let target = dependency.Target.FullName
            where target == forbidden || (forbidden.EndsWith('.') && target.StartsWith(forbidden, StringComparison.Ordinal))
            select type.FullName;
        Assert.Empty(users.Distinct());
    }

    [Fact]
    public void Public_values_do_not_change()
    {
        var settable =
            from type in Core.GetExportedTypes()
            from property in type.GetProperties(BindingFlags.Public | BindingFlags.Instance | BindingFlags.DeclaredOnly)
            let setter = property.SetMethod
            where setter is { IsPublic: true } && !IsInit(setter)
            select $"{type.Name}.{property.Name}";
        var fields =
            from type in Core.GetExportedTypes()
            where !type.IsEnum
            from field in type.GetFields(BindingFlags.Public | BindingFlags.Instance | BindingFlags.DeclaredOnly)
            where !field.IsInitOnly
            select $"{type.Name}.{field.Name}";
        Assert.Empty(settable.Concat(fields));
    }

    [Fact]
    public void The_geometry_library_does_not_leak_out()
    {
        var leaks =
            from type in Core.GetExportedTypes()
            from member in type.GetMembers(BindingFlags.Public | BindingFlags.Instance | BindingFlags.Static | BindingFlags.DeclaredOnly)
            where Mentioned(member).Any(mentioned => mentioned.Namespace?.StartsWith("NetTopologySuite", StringComparison.Ordinal) == true)
            select $"{type.Name}.{member.Name}";
        Assert.Empty(leaks);
    }

    [Fact]
    public void Files_and_pages_do_not_know_each_other()
    {
        Assert.Equal(["SurveyPlanner"], ProjectReferences("SurveyPlanner.Files"));
        Assert.Equal(["SurveyPlanner"], ProjectReferences("SurveyPlanner.Pages"));
        Assert.Empty(ProjectReferences("SurveyPlanner"));
    }

    private static IEnumerable<string> ProjectReferences(string project)
        => File.ReadLines(Path.Combine(ReferenceData.Root, "src", project, project + ".csproj"))
            .Where(line => line.Contains("<ProjectReference", StringComparison.Ordinal))
            .Select(line => Path.GetFileNameWithoutExtension(line.Split('"')[1]));

    /// <summary>The folder of a type of ours, empty for the root, null for types of others.</summary>
    private static string? Folder(string fullName)
    {
        const string prefix = "SurveyPlanner.";
        if (!fullName.StartsWith(prefix, StringComparison.Ordinal))
        {
            return null;
        }

        var rest = fullName[prefix.Length..].Split('`', '<', '/', '+')[0];
        var dot = rest.IndexOf('.', StringComparison.Ordinal);
        return dot < 0 ? "" : rest[..dot];
    }

    private static bool IsInit(MethodInfo setter)
        => setter.ReturnParameter.GetRequiredCustomModifiers().Contains(typeof(IsExternalInit));

    private static IEnumerable<System.Type> Mentioned(MemberInfo member) => member switch
    {
        MethodInfo method => method.GetParameters().Select(parameter => parameter.ParameterType).Append(method.ReturnType),
        PropertyInfo property => [property.PropertyType],
        ConstructorInfo constructor => constructor.GetParameters().Select(parameter => parameter.ParameterType),
        FieldInfo field => [field.FieldType],
        _ => [],
    };
}
