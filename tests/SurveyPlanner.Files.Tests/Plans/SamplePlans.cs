namespace SurveyPlanner.Files.Tests.Plans;

/// <summary>Plans of invented surveys in invented places.</summary>
internal static class SamplePlans
{
    public const string Least = """
        [region]
        boundary = "moor.geojson"

        [layout]
        kind = "parallel"
        lines = 20
        half_width = "100 m"
        """;

    public const string Full = """
        [survey]
        name = "Merrow Sound, sea ducks by boat"
        seed = 20270401

        [region]
        boundary = "sound.gpkg"
        layer = "zones"
        crs = "EPSG:25832"
        stratum_field = "zone"
        strata = ["inner bay", "outer sound", "reef"]
        exclusions = ["closed.geojson", "/shared/range.geojson"]
        exclusion_buffer = "500 m"
        projection = "azimuthal"

        [layout]
        kind = "parallel"        # a comment
        bearing = "short-axis"
        spacing = "5 km"
        half_width = "300 m"
        edge = "minus"
        min_length = "200 m"

        [stratum."inner bay"]
        kind = "zigzag"
        turning = "adjusted-angle"
        crossed = true
        bearing = 45.5
        edge = "plus"
        cost_per_km = "35 EUR"

        [stratum.reef]
        kind = "point-grid"
        points = 60
        grid = "triangular"
        cost_per_point = "20 EUR"

        [coverage]
        cells = 10_000
        replicates = 500

        [precision]
        target_cv = 0.20
        assurance = 0.80
        b = 3
        allocation = "optimal"
        min_lines = 12

        [pilot]
        transects = "pilot/transects.csv"
        detections = 'pilot/detections.csv'
        estimator = "adjacent-pairs"
        cluster_size = 2.4
        cluster_size_sd = 1.7

        [detection]
        models = ["half-normal", "hazard-rate"]
        truncation = "250 m"
        cv = 0.12
        df = 60
        effective_half_width = "180 m"

        [platform]

        [output]
        """;
}
