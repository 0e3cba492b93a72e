using System.Globalization;
using BenchmarkDotNet.Attributes;
using SurveyPlanner.Layouts;
using SurveyPlanner.Numerics;
using SurveyPlanner.Regions;
using SurveyPlanner.TestShapes;

namespace SurveyPlanner.Benchmarks;

/// <summary>One realisation drawn and cut at a rough coast, one thread: how it grows with vertices and with lines. Allocates nothing.</summary>
[ShortRunJob]
[MemoryDiagnoser]
public class ClippingBenchmarks
{
    private double _offset;
    private readonly PieceBuffer _buffer = new();
    private Stratum _island = null!;
    private LayoutGenerator _parallel = null!;
    private LayoutGenerator _equalSpaced = null!;
    private LayoutGenerator _adjustedAngle = null!;
    private LayoutGenerator _segments = null!;

    /// <summary>Vertices of the coast and lines across the island.</summary>
    [ParamsSource(nameof(Sizes))]
    public Size Problem { get; set; } = null!;

    public static IEnumerable<Size> Sizes =>
    [
        new(1_000, 1000), new(10_000, 1000), new(100_000, 1000), new(1_000_000, 1000), new(100_000, 100), new(100_000, 10_000),
    ];

    [GlobalSetup]
    public void Setup()
    {
        _island = CoverageScene.Island(Problem.Vertices);
        _parallel = Prepare(LayoutKind.Parallel);
        _equalSpaced = Prepare(LayoutKind.Zigzag);
        _adjustedAngle = Prepare(LayoutKind.Zigzag, ZigzagTurning.AdjustedAngle);

        // As many segments as lines, on a grid.
        var side = Math.Sqrt(_parallel.Stratum.Clip.AreaSquareMetres / Problem.Lines);
        _segments = PlaneStrata.Prepare(_island, Design(LayoutKind.Segments, side) with { SegmentMetres = side / 2 });

        // The first look along slanted lines sorts the edges into tiles, and the buffers grow once.
        Equal_spaced_zigzag();
        Adjusted_angle_zigzag();
        Parallel();
        Segments();
    }

    [Benchmark]
    public int Parallel() => Draw(_parallel);

    [Benchmark]
    public int Equal_spaced_zigzag() => Draw(_equalSpaced);

    [Benchmark]
    public int Adjusted_angle_zigzag() => Draw(_adjustedAngle);

    [Benchmark]
    public int Segments() => Draw(_segments);

    /// <summary>What comes before the first draw of parallel lines: the outline turned and its edges sorted.</summary>
    [Benchmark]
    public int Made_ready() => Prepare(LayoutKind.Parallel).OffsetRanges.Length;

    private int Draw(LayoutGenerator generator)
    {
        Span<double> offsets = stackalloc double[generator.OffsetRanges.Length];
        // Never near the last: what neighbouring draws share is no part of this.
        _offset = (_offset + 0.618) % 1;
        offsets.Fill(_offset);
        var random = new PhiloxStream(CoverageScene.Seed, RandomPurpose.Expectation, 0, 0);
        _buffer.Clear();
        generator.Realise(offsets, ref random, _buffer);
        return _buffer.Count;
    }

    private LayoutGenerator Prepare(LayoutKind kind, ZigzagTurning turning = ZigzagTurning.EqualSpaced)
        => PlaneStrata.Prepare(_island, Design(kind, (_island.Shape.MaxX - _island.Shape.MinX) / Problem.Lines) with { Turning = turning });

    private static LayoutDesign Design(LayoutKind kind, double spacing) => PlaneStrata.LinesAcrossX(spacing, spacing / 20, kind);

    public sealed record Size(int Vertices, int Lines)
    {
        public override string ToString() => string.Create(CultureInfo.InvariantCulture, $"{Vertices:#,0} v, {Lines:#,0} l");
    }
}
