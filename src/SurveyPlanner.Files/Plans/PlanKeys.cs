using System.Collections.Immutable;
using SurveyPlanner.Coverage;
using SurveyPlanner.Effort;
using SurveyPlanner.Files.Units;
using SurveyPlanner.Layouts;
using SurveyPlanner.Pilots;

namespace SurveyPlanner.Files.Plans;

/// <summary>
/// Every key of the plan file. To add one of a layout: a line here and a row in docs/plan-file.md (a test compares the two); of another
/// table: also a use in <see cref="DesignBuilder"/>. A new kind of layout needs nothing but the keys that are its own.
/// </summary>
internal static class PlanKeys
{
    /// <summary>Tables whose keys are not settled yet: an empty one is accepted.</summary>
    public static readonly ImmutableArray<string> ReservedTables = ["platform", "population", "rehearsal", "output"];

    private static readonly TextReader Text = new();
    private static readonly PathReader File = new();
    private static readonly LengthReader Length = new();
    private static readonly QuantityReader<Money> Money = new(
        "a sum of money with its currency, more than 0", QuantityText.ReadMoney, money => money.Amount, money => $"{DecimalText.Write(money.Amount)} {money.Currency}");
    private static readonly QuantityReader<GivenRate> Rate = new(
        "detections per length (or per visit), more than 0", QuantityText.ReadEncounterRate, rate => rate.Value, rate => DecimalText.Write(rate.Value) + (rate.PerVisit ? " /visit" : " /km"));
    private static readonly List<PlanKey> Listed = [];

    // [survey]
    public static readonly PlanKey<string> Name = Add(
        "survey", "name", Text, "\"Example sound, sea ducks by boat\"",
        doc: "Name of the survey; without it, the name of the plan file.");

    public static readonly PlanKey<long> Seed = Add(
        "survey", "seed", new WholeReader(0, long.MaxValue), "20270401",
        doc: "The number that everything random comes from; without it one is taken from the system, shown and recorded.");

    // [region]
    public static readonly PlanKey<ImmutableArray<string>> Boundary = Add(
        "region", "boundary", new ListReader<string>(File), "\"sound.geojson\"",
        doc: "The boundary file, or several: each is then a stratum named by its file, unless stratum_field says otherwise. Required.");

    public static readonly PlanKey<ImmutableArray<string>> Layer = Add(
        "region", "layer", new ListReader<string>(Text), "\"zones\"",
        doc: "The layer of it, where the file holds several, or several of them: each is then a stratum named by its layer.");

    public static readonly PlanKey<string> Crs = Add(
        "region", "crs", Text, "\"EPSG:25832\"",
        doc: "Its coordinate system, where the file does not say.");

    public static readonly PlanKey<string> StratumField = Add(
        "region", "stratum_field", Text, "\"zone\"",
        doc: "The attribute of the boundary that names the strata; without it the region is one stratum.");

    public static readonly PlanKey<ImmutableArray<string>> Strata = Add(
        "region", "strata", new ListReader<string>(Text), "[\"inner bay\", \"outer sound\"]",
        doc: "The strata to survey, in this order; without it all that the boundary holds.");

    public static readonly PlanKey<ImmutableArray<string>> Exclusions = Add(
        "region", "exclusions", new ListReader<string>(File), "\"closed-areas.geojson\"",
        doc: "Files of areas that are cut out of the region.");

    public static readonly PlanKey<double> ExclusionBuffer = Add(
        "region", "exclusion_buffer", new LengthReader(zeroIsAllowed: true), "\"500 m\"", @default: 0.0,
        doc: "How far to keep away from the exclusions.");

    public static readonly PlanKey<string> Projection = Add(
        "region", "projection", Text, "\"azimuthal\"",
        doc: "The equal-area projection to plan in; without it the one that distorts least.");

    // [layout] and [stratum."name"]
    public static readonly PlanKey<LayoutKind> Kind = Layout(
        "kind", new ChoiceReader<LayoutKind>(), "\"parallel\"", KindFilter.Any, (design, kind) => design with { Kind = kind }, isRequired: true,
        doc: "The kind of layout. Required.");

    public static readonly PlanKey<Bearing> Bearing = Layout(
        "bearing", new BearingReader(), "\"short-axis\"", KindFilter.Any, (design, bearing) => design with { Bearing = bearing }, @default: new Bearing.ShortAxis(),
        doc: "The direction that lines (or the rows of a grid) run: degrees clockwise from true north at the stratum's centre, or along an axis of the stratum; along FILE: at right angles to the lines drawn in a GeoJSON file, such as a coast or a depth contour; for segments also each at random. A zigzag swings about it.");

    public static readonly PlanKey<double> Spacing = Layout(
        "spacing", Length, "\"5 km\"", KindFilter.Any, (design, metres) => design with { Sizing = new Sizing.Spacing(metres) }, group: KeyGroup.Sizing,
        doc: "Distance between neighbouring lines, segments, loops or points; of a zigzag, between its turning points along the axis.");

    public static readonly PlanKey<long> Lines = Layout(
        "lines", new WholeReader(1, 100_000), "20", KindFilter.Lines, (design, count) => design with { Sizing = new Sizing.Number((int)count) }, group: KeyGroup.Sizing,
        doc: "Instead of a spacing: expected number of lines, segments or loops, or of legs of a zigzag, in the stratum.");

    public static readonly PlanKey<long> Points = Layout(
        "points", new WholeReader(1, 100_000), "60", KindFilter.Points, (design, count) => design with { Sizing = new Sizing.Number((int)count) }, group: KeyGroup.Sizing,
        doc: "Instead of a spacing: expected number of points in the stratum.");

    public static readonly PlanKey<double> TotalLength = Layout(
        "total_length", Length, "\"400 km\"", KindFilter.Lines, (design, metres) => design with { Sizing = new Sizing.TotalLength(metres) }, group: KeyGroup.Sizing,
        doc: "Instead of a spacing: expected total length of line in the stratum.");

    public static readonly PlanKey<SizeFrom> SizeFrom = Layout(
        "size_from", new ChoiceReader<SizeFrom>(), "\"precision\"", KindFilter.Any, (design, _) => design with { Sizing = new Sizing.Precision() }, group: KeyGroup.Sizing,
        doc: "Instead of a spacing: whatever the target precision asks for.");

    public static readonly PlanKey<LengthField> SpacingField = Layout(
        "spacing_field", new LengthFieldReader(), "\"gap in km\"", KindFilter.Any, (design, field) => design with { Sizing = new Sizing.FromField(field) }, group: KeyGroup.Sizing,
        doc: "Instead of a spacing: the attribute of the boundary that holds it, zone by zone, and its unit.");

    public static readonly PlanKey<double> HalfWidth = Layout(
        "half_width", Length, "\"300 m\"", KindFilter.Lines, (design, metres) => design with { HalfWidthMetres = metres }, group: KeyGroup.Reach,
        doc: "Strip half-width: how far out from a line animals count. Required for lines.");

    public static readonly PlanKey<double> Radius = Layout(
        "radius", Length, "\"150 m\"", KindFilter.Points, (design, metres) => design with { HalfWidthMetres = metres }, group: KeyGroup.Reach,
        doc: "How far out from a point animals count. Required for points.");

    public static readonly PlanKey<LengthField> HalfWidthField = Layout(
        "half_width_field", new LengthFieldReader(), "\"strip in m\"", KindFilter.Any, (design, field) => design with { HalfWidthField = field }, group: KeyGroup.Reach,
        doc: "Instead of a half-width or radius: the attribute of the boundary that holds it, and its unit.");

    public static readonly PlanKey<string> BearingField = Layout(
        "bearing_field", Text, "\"heading\"", KindFilter.Any, (design, field) => design with { Bearing = new Bearing.FromField(field) },
        doc: "The attribute of the boundary that holds the bearing in degrees; it counts more than bearing.");

    public static readonly PlanKey<EdgeRule> Edge = Layout(
        "edge", new ChoiceReader<EdgeRule>(), "\"minus\"", KindFilter.Any, (design, edge) => design with { Edge = edge }, @default: EdgeRule.Minus,
        doc: "Whether transects stop at the boundary (minus) or run on past it by the half-width or radius (plus).");

    public static readonly PlanKey<GridShape> Grid = Layout(
        "grid", new ChoiceReader<GridShape>(), "\"triangular\"", KindFilter.Only(LayoutKind.PointGrid), (design, grid) => design with { Grid = grid }, @default: GridShape.Square,
        doc: "Shape of the grid.");

    public static readonly PlanKey<ZigzagTurning> Turning = Layout(
        "turning", new ChoiceReader<ZigzagTurning>(), "\"adjusted-angle\"", KindFilter.Only(LayoutKind.Zigzag), (design, turning) => design with { Turning = turning }, @default: ZigzagTurning.EqualSpaced,
        doc: "How the zigzag turns.");

    public static readonly PlanKey<bool> Crossed = Layout(
        "crossed", new YesNoReader(), "true", KindFilter.Only(LayoutKind.Zigzag), (design, crossed) => design with { Crossed = crossed }, @default: false,
        doc: "Whether a second, mirrored pass crosses the first on the way back.");

    public static readonly PlanKey<double> MinLength = Layout(
        "min_length", new LengthReader(zeroIsAllowed: true), "\"200 m\"", KindFilter.Lines, (design, metres) => design with { MinLengthMetres = metres }, @default: 0.0,
        doc: "Stretches of line shorter than this are left out: splinters between islands.");

    public static readonly PlanKey<LinePlacement> Placement = Layout(
        "placement", new ChoiceReader<LinePlacement>(), "\"one-per-band\"", KindFilter.Only(LayoutKind.RandomParallel), (design, placement) => design with { Placement = placement }, @default: LinePlacement.Independent,
        doc: "Whether each line lies anywhere, or one in each of as many equal bands as there are lines.");

    public static readonly PlanKey<double> SegmentLength = Layout(
        "length", Length, "\"1 km\"", KindFilter.Only(LayoutKind.Segments), (design, metres) => design with { SegmentMetres = metres }, isRequired: true,
        doc: "Length of each segment. Required for segments.");

    public static readonly PlanKey<double> Side = Layout(
        "side", Length, "\"500 m\"", KindFilter.Only(LayoutKind.Loops), (design, metres) => design with { SideMetres = metres }, isRequired: true,
        doc: "Side of each square circuit. Required for loops.");

    public static readonly PlanKey<CrossingRule> Crossing = Layout(
        "crossing", new ChoiceReader<CrossingRule>(), "\"keep\"", KindFilter.Only(LayoutKind.Segments, LayoutKind.Loops), (design, crossing) => design with { Crossing = crossing }, @default: CrossingRule.Clip,
        doc: "Whether segments and loops that cross the boundary are cut there (clip), or kept whole if they start inside and left out if not (keep).");

    public static readonly PlanKey<double> Step = Layout(
        "step", Length, "\"400 m\"", KindFilter.Only(LayoutKind.PointsOnLines), (design, metres) => design with { StepMetres = metres }, isRequired: true,
        doc: "Distance from one point to the next along a line; spacing is that between lines. Required for points on lines.");

    public static readonly PlanKey<long> Reserve = Layout(
        "reserve", new WholeReader(0, 100_000), "20", KindFilter.Only(LayoutKind.RandomPoints, LayoutKind.BalancedPoints), (design, count) => design with { Reserve = (int)count }, @default: 0L,
        doc: "Number of spare points, listed in the order in which they are to be used.");

    // [stratum."name"] only
    public static readonly PlanKey<Money> CostPerKm = Add(
        "stratum", "cost_per_km", Money, "\"35 EUR\"", kinds: KindFilter.Lines,
        doc: "What a kilometre of line costs in this stratum, for the optimal allocation.");

    public static readonly PlanKey<Money> CostPerPoint = Add(
        "stratum", "cost_per_point", Money, "\"20 EUR\"", kinds: KindFilter.Points,
        doc: "What a visit to a point costs in this stratum, for the optimal allocation.");

    // [coverage]
    public static readonly PlanKey<long> Cells = Add(
        "coverage", "cells", new WholeReader(1, int.MaxValue), "10000",
        doc: "Number of cells over the whole region; without it so many that the smallest stratum has at least 500.");

    public static readonly PlanKey<long> Replicates = Add(
        "coverage", "replicates", new WholeReader(2, CoverageDesign.MostReplicates), "1000", @default: (long)CoverageDesign.DefaultReplicates,
        doc: "Number of simulated draws of the layout.");

    // [precision]
    public static readonly PlanKey<double> TargetCv = Add(
        "precision", "target_cv", new ShareReader("a coefficient of variation", "above 0 and at most 1", value => value is > 0 and <= 1, "it would take endless effort"), "0.20",
        doc: "The coefficient of variation of density that the decision needs.");

    public static readonly PlanKey<double> Assurance = Add(
        "precision", "assurance", new ShareReader("a probability", "from 0.5 to below 1", value => value is >= 0.5 and < 1, "even odds are 0.5"), "0.80",
        doc: "How sure to be of reaching it, given how little the pilot knows; without it the plain estimate.");

    public static readonly PlanKey<double> B = Add(
        "precision", "b", new NumberReader("a number above 0", value => value > 0), "3.0",
        doc: "The constant b of the rule of thumb for effort; without it the pilot gives it, and where there is no pilot it is 3.");

    public static readonly PlanKey<Allocation> Allocation = Add(
        "precision", "allocation", new ChoiceReader<Allocation>(), "\"optimal\"", @default: Effort.Allocation.Proportional,
        doc: "How effort is shared among strata: by area, the same to each, or for the least variance (Neyman), with costs where given.");

    public static readonly PlanKey<long> MinLines = Add(
        "precision", "min_lines", new WholeReader(1, 100_000), "10", @default: (long)EffortDesign.DefaultMinLines,
        doc: "Least number of lines (or points) a stratum gets.");

    // [pilot]
    public static readonly PlanKey<string> Transects = Add(
        "pilot", "transects", File, "\"pilot-transects.csv\"",
        doc: "Table of the pilot's transects.");

    public static readonly PlanKey<string> Detections = Add(
        "pilot", "detections", File, "\"pilot-detections.csv\"",
        doc: "Table of its detections, where distances or cluster sizes were noted.");

    public static readonly PlanKey<GivenRate> EncounterRate = Add(
        "pilot", "encounter_rate", Rate, "\"0.8 /km\"",
        doc: "Detections per length of line (at points: \"1.5 /visit\"), where there is no table.");

    public static readonly PlanKey<EncounterRateEstimator> Estimator = Add(
        "pilot", "estimator", new ChoiceReader<EncounterRateEstimator>(), "\"random-lines\"",
        doc: "Variance estimator of the encounter rate; without it the one that suits the layout.");

    public static readonly PlanKey<double> ClusterSize = Add(
        "pilot", "cluster_size", new NumberReader("a number from 1 on", value => value >= 1), "2.4",
        doc: "Mean cluster size, where no detections give it.");

    public static readonly PlanKey<double> ClusterSizeSd = Add(
        "pilot", "cluster_size_sd", new NumberReader("a number from 0 on", value => value >= 0), "1.7", @default: 0.0,
        doc: "Standard deviation of cluster size.");

    // [detection]
    public static readonly PlanKey<ImmutableArray<DetectionModel>> Models = Add(
        "detection", "models", new ListReader<DetectionModel>(new ChoiceReader<DetectionModel>()), "[\"half-normal\", \"hazard-rate\"]",
        doc: "Detection models to fit to the pilot's distances.");

    public static readonly PlanKey<double> Truncation = Add(
        "detection", "truncation", Length, "\"250 m\"",
        doc: "Distance beyond which detections are left out; without it the half-width or radius.");

    public static readonly PlanKey<double> DetectionCv = Add(
        "detection", "cv", new ShareReader("a coefficient of variation", "from 0 to 1", value => value is >= 0 and <= 1), "0.12",
        doc: "Coefficient of variation of the effective strip half-width (points: of the effective area), where it is given and not fitted.");

    public static readonly PlanKey<double> DetectionDf = Add(
        "detection", "df", new NumberReader("a number above 0", value => value > 0), "60.0",
        doc: "Its degrees of freedom; without it so many that they do not matter.");

    public static readonly PlanKey<double> EffectiveHalfWidth = Add(
        "detection", "effective_half_width", Length, "\"180 m\"",
        doc: "Effective strip half-width of lines, where it is given and not fitted.");

    public static readonly PlanKey<double> EffectiveRadius = Add(
        "detection", "effective_radius", Length, "\"90 m\"",
        doc: "Effective radius of points, where it is given and not fitted.");

    public static IReadOnlyList<PlanKey> All => Listed;

    /// <summary>Tables that a plan file may hold, strata apart.</summary>
    public static IEnumerable<string> Tables => Listed.Select(key => key.Table).Where(table => table != "stratum").Concat(ReservedTables).Distinct();

    /// <summary>The keys of a table; a stratum's has those of the layout and its own.</summary>
    public static IEnumerable<PlanKey> Of(string table) => Listed.Where(key => key.Table == table || (table == "stratum" && key.Table == "layout"));

    public static PlanKey? Find(string table, string name) => Of(table).FirstOrDefault(key => key.Name == name);

    /// <summary>The key that says how far out animals count.</summary>
    public static PlanKey<double> ReachOf(LayoutKind kind) => kind.IsPoints() ? Radius : HalfWidth;

    private static PlanKey<T> Layout<T>(
        string name,
        ValueReader<T> reader,
        string example,
        KindFilter kinds,
        Func<LayoutDesign, T, LayoutDesign> into,
        string doc,
        object? @default = null,
        KeyGroup group = KeyGroup.None,
        bool isRequired = false)
        where T : notnull
        => List(new PlanKey<T>("layout", name, reader, example, doc) { Kinds = kinds, Into = into, Default = @default, Group = group, IsRequired = isRequired });

    private static PlanKey<T> Add<T>(string table, string name, ValueReader<T> reader, string example, string doc, object? @default = null, KindFilter? kinds = null)
        where T : notnull
        => List(new PlanKey<T>(table, name, reader, example, doc) { Default = @default, Kinds = kinds });

    private static PlanKey<T> List<T>(PlanKey<T> key)
        where T : notnull
    {
        Listed.Add(key);
        return key;
    }
}

/// <summary>What may size a layout besides figures.</summary>
internal enum SizeFrom
{
    Precision,
}
