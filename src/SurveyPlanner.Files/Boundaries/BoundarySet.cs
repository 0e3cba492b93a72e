using System.Collections.Immutable;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>Several files, or several layers of one, as one boundary: every feature then knows which it came from.</summary>
/// <param name="Boundary">All features.</param>
/// <param name="StratumField">The attribute that tells files or layers apart; null where there is only one.</param>
public sealed record BoundarySet(Boundary Boundary, string? StratumField)
{
    /// <summary>Attribute that holds the name of the file without its extension.</summary>
    public const string FileField = "file";

    /// <summary>Attribute that holds the name of the layer.</summary>
    public const string LayerField = "layer";

    /// <summary>Reads every layer asked for of every file.</summary>
    /// <param name="paths">The files, at least one.</param>
    /// <param name="layers">Layers to read of each; empty for the only one.</param>
    /// <param name="crs">Coordinate system, where the files do not say.</param>
    /// <param name="files">The files of the run; unless given, of this reading alone.</param>
    public static BoundarySet Read(ImmutableArray<string> paths, ImmutableArray<string> layers, string? crs, InputFiles? files = null)
    {
        files ??= new InputFiles();
        var parts = (
            from path in paths
            from layer in layers.IsDefaultOrEmpty ? [null] : layers.Cast<string?>()
            let boundary = BoundaryReader.Read(path, new BoundaryOptions { Layer = layer, Crs = crs }, files)
            select (Path: path, Layer: layer, Boundary: boundary)).ToList();
        if (parts.Count == 1)
        {
            return new BoundarySet(parts[0].Boundary, null);
        }

        var features = parts
            .SelectMany(part => part.Boundary.Features.Select(feature => Named(feature, part.Path, part.Layer)))
            .Select((feature, i) => feature with { Number = i + 1 });
        return new BoundarySet(
            new Boundary(
                string.Join(" and ", parts.Select(part => part.Boundary.Source).Distinct()),
                [.. features],
                string.Join("; ", parts.Select(part => part.Boundary.CoordinateSystem).Distinct()),
                [.. parts.SelectMany(part => part.Boundary.Notices)]),
            paths.Length > 1 ? FileField : LayerField);
    }

    private static BoundaryFeature Named(BoundaryFeature feature, string path, string? layer)
    {
        var attributes = feature.Attributes.SetItem(FileField, Path.GetFileNameWithoutExtension(path));
        return feature with { Attributes = layer is null ? attributes : attributes.SetItem(LayerField, layer) };
    }
}
