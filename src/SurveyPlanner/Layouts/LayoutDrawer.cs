using System.Collections.Immutable;
using System.Globalization;
using SurveyPlanner.Numerics;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Layouts;

/// <summary>Draws the layout that will be surveyed: one random offset for each stratum, from the seed.</summary>
internal static class LayoutDrawer
{
    // Thomas, Williams and Sandilands 2007, Journal of Cetacean Research and Management 9:1-13: at least 10 to 20 in each stratum.
    private const double FewestTransects = 10;

    /// <summary>Draws all strata; ids and order run through the whole survey.</summary>
    public static ImmutableArray<Layout> Draw(IReadOnlyList<LayoutGenerator> generators, EqualAreaProjection projection, ulong seed)
    {
        var realisations = generators.Select((generator, i) => Realise(generator, seed, (uint)i)).ToList();
        var ids = new TransectIds([.. realisations.Select(realisation => realisation.Transects)], [.. generators.Select(generator => generator.ReserveCount)]);
        var order = 0;
        var layouts = ImmutableArray.CreateBuilder<Layout>(generators.Count);
        for (var i = 0; i < generators.Count; i++)
        {
            layouts.Add(Describe(generators[i], realisations[i], projection, i, ids, order));
            order += realisations[i].Transects;
        }

        return layouts.MoveToImmutable();
    }

    /// <summary>One stratum's draw in its turned frame.</summary>
    public static Realisation Realise(LayoutGenerator generator, ulong seed, uint stratum)
    {
        var random = new PhiloxStream(seed, RandomPurpose.Layout, stratum, replicate: 0);
        var offsets = new double[generator.OffsetRanges.Length];
        for (var axis = 0; axis < offsets.Length; axis++)
        {
            offsets[axis] = random.NextDouble();
        }

        var again = random;
        var (buffer, reserve) = (new PieceBuffer(), new PieceBuffer());
        generator.Realise(offsets, ref random, buffer);
        generator.RealiseReserve(offsets, ref again, reserve);
        return new Realisation(offsets, [.. buffer.Pieces], [.. reserve.Pieces]);
    }

    private static Layout Describe(
        LayoutGenerator generator, Realisation realisation, EqualAreaProjection projection, int stratum, TransectIds ids, int ordersBefore)
    {
        var builder = new TransectBuilder(generator, projection);
        var transects = realisation.Pieces
            .GroupBy(piece => piece.Transect)
            .Select(pieces => builder.Build(ids.Of(stratum, pieces.Key), ordersBefore + pieces.Key + 1, [.. pieces]))
            .ToImmutableArray();
        var spread = EffortIntegral.Over(generator, out var meanCount);
        return new Layout(
            generator.Stratum.Stratum.Name,
            generator.Design,
            generator.Stratum.BearingDegrees,
            generator.SpacingMetres,
            [.. realisation.Offsets.Zip(generator.OffsetRanges.ToArray(), (offset, range) => offset * range)],
            transects,
            generator.Design.IsPoints ? null : generator.ExpectedLength ?? spread.Mean,
            generator.ExpectedCount ?? meanCount,
            spread,
            Notices(generator, transects.Length, generator.ExpectedCount ?? meanCount))
        {
            Reserve = [.. realisation.Reserve.Select(piece => builder.Build(ids.OfReserve(stratum, piece.Transect), piece.Transect + 1, [piece]))],
        };
    }

    private static ImmutableArray<Notice> Notices(LayoutGenerator generator, int transects, double expectedCount)
    {
        var notices = ImmutableArray.CreateBuilder<Notice>();
        var name = generator.Stratum.Stratum.Name;
        if (transects == 0)
        {
            notices.Add(new Notice(
                NoticeKind.Warning,
                $"this draw places no transect in stratum '{name}', although the spacing fits; a stratum this small against its spacing needs a smaller one"));
        }

        if (expectedCount < FewestTransects - 0.5)
        {
            var what = generator.Design.IsPoints ? "points" : "lines";
            notices.Add(new Notice(NoticeKind.Warning, string.Create(
                CultureInfo.InvariantCulture,
                $"stratum '{name}' gets about {expectedCount:0.#} {what} only; at least 10 to 20 are advised (Thomas, Williams and Sandilands 2007), and from a single one no variance can be estimated; choose a smaller spacing there")));
        }

        if (generator.Warning is { } warning)
        {
            notices.Add(new Notice(NoticeKind.Warning, warning));
        }

        if (generator.Design.IsSystematic && 2 * generator.Stratum.HalfWidthMetres > generator.SpacingMetres)
        {
            var (what, reach) = generator.Design.IsPoints ? ("radius", "disks") : ("half-width", "strips");
            notices.Add(new Notice(NoticeKind.Warning, string.Create(
                CultureInfo.InvariantCulture,
                $"in stratum '{name}' the {what} of {generator.Stratum.HalfWidthMetres:0.###} m is more than half the spacing of {generator.SpacingMetres:0.###} m, so {reach} overlap and some animals may be counted twice; coverage is computed for overlapping {reach}")));
        }

        return notices.ToImmutable();
    }

    /// <summary>A draw: the offsets as shares of their ranges, its pieces, and its spare points in order.</summary>
    internal sealed record Realisation(double[] Offsets, Piece[] Pieces, Piece[] Reserve)
    {
        public int Transects => Pieces.Length == 0 ? 0 : Pieces[^1].Transect + 1;
    }
}
