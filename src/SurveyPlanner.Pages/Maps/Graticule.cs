using SurveyPlanner.Pages.Words;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Pages.Maps;

/// <summary>
/// Meridians and parallels over a map, clipped to it, with their labels inside the frame. Works across 180° and with a pole on the map.
/// </summary>
/// <param name="Path">All lines as one SVG path.</param>
/// <param name="Labels">Degrees at the lines, none over another.</param>
public sealed record Graticule(string Path, IReadOnlyList<Label> Labels)
{
    private const double LeastSpacingPixels = 130;

    // Where meridians come closer than this they are a smudge; only every 90th degree runs on to the pole.
    private const double CrowdedPixels = 14;
    private const int Samples = 144;
    private const double LabelSize = 12;

    private static readonly double[] StepsMinutes = [.1, .2, .5, 1, 2, 5, 10, 15, 20, 30, 60, 120, 300, 600, 900, 1800];

    internal static Graticule For(EqualAreaProjection projection, MapFrame frame, LabelPlacer placer)
    {
        var window = Window.Of(projection, frame);
        if (window is null)
        {
            return new Graticule("", []);
        }

        var path = new PathData();
        var labels = new List<Label>();
        var meridians = StepFor(window.PixelsPerDegreeLon);
        foreach (var lon in window.Meridians(meridians))
        {
            var line = Enumerable.Range(0, Samples + 1)
                .Select(i => window.MinLat + ((window.MaxLat - window.MinLat) * i / Samples))
                .Select(lat => Math.Abs(lon % 90) > 1e-9 && window.SpacingAt(lat, meridians) < CrowdedPixels ? null : window.At(lon, lat));
            var pieces = FrameClip.Clip(line, frame);
            Add(pieces, path);
            Consider(labels, placer, MeridianPlaces(pieces, frame), DegreeText.Longitude(lon, meridians));
        }

        var parallels = StepFor(window.PixelsPerDegreeLat);
        foreach (var lat in window.Parallels(parallels))
        {
            var line = Enumerable.Range(0, Samples + 1)
                .Select(i => window.At(window.CentreLon + window.MinRelLon + ((window.MaxRelLon - window.MinRelLon) * i / Samples), lat));
            var pieces = FrameClip.Clip(line, frame);
            Add(pieces, path);
            Consider(labels, placer, ParallelPlaces(pieces, frame, window.At(window.CentreLon, lat)), DegreeText.Latitude(lat, parallels));
        }

        return new Graticule(path.ToString(), labels);
    }

    private static double StepFor(double pixelsPerDegree)
    {
        var index = Array.FindIndex(StepsMinutes, minutes => minutes / 60 * pixelsPerDegree >= LeastSpacingPixels);
        return (index < 0 ? StepsMinutes[^1] : StepsMinutes[index]) / 60;
    }

    private static void Add(IEnumerable<Pixel[]> pieces, PathData path)
    {
        foreach (var piece in pieces)
        {
            path.Polyline(piece);
        }
    }

    private static void Consider(List<Label> labels, LabelPlacer placer, IEnumerable<(Pixel Place, Anchor Anchor)> places, string text)
    {
        var label = places.Select(p => new Label(text, p.Place, p.Anchor)).FirstOrDefault(label => placer.TryPlace(label, LabelSize));
        if (label is not null)
        {
            labels.Add(label);
        }
    }

    // Along the lower edge for choice, else the upper, else the sides.
    private static IEnumerable<(Pixel, Anchor)> MeridianPlaces(IReadOnlyList<Pixel[]> pieces, MapFrame frame)
    {
        var ends = pieces.SelectMany(piece => new[] { piece[0], piece[^1] }).ToList();
        return ends.Where(end => end.Y > frame.Height - 0.05).Select(end => (end with { Y = frame.Height - 7 }, Anchor.Middle))
            .Concat(ends.Where(end => end.Y < 0.05).Select(end => (end with { Y = 17 }, Anchor.Middle)))
            .Concat(ends.Where(end => end.X < 0.05).Select(end => (new Pixel(7, end.Y - 4), Anchor.Start)))
            .Concat(ends.Where(end => end.X > frame.Width - 0.05).Select(end => (new Pixel(frame.Width - 7, end.Y - 4), Anchor.End)));
    }

    // Along the left edge for choice, else the right, else (a circle round the pole) on the middle meridian.
    private static IEnumerable<(Pixel, Anchor)> ParallelPlaces(IReadOnlyList<Pixel[]> pieces, MapFrame frame, Pixel? middle)
    {
        var ends = pieces.SelectMany(piece => new[] { piece[0], piece[^1] }).ToList();
        return ends.Where(end => end.X < 0.05).Select(end => (new Pixel(7, end.Y - 4), Anchor.Start))
            .Concat(ends.Where(end => end.X > frame.Width - 0.05).Select(end => (new Pixel(frame.Width - 7, end.Y - 4), Anchor.End)))
            .Concat(middle is { } m ? [(new Pixel(m.X, m.Y - 4), Anchor.Middle)] : []);
    }

    /// <summary>What the map shows in degrees: longitudes relative to the middle, so that 180° is a place like any other.</summary>
    private sealed record Window(
        EqualAreaProjection Projection, MapFrame Frame, double CentreLon, double CentreLat,
        double MinRelLon, double MaxRelLon, double MinLat, double MaxLat)
    {
        private const int Lattice = 24;

        public double PixelsPerDegreeLat => Distance(At(CentreLon, Inward(0)), At(CentreLon, Inward(.01))) * 100;

        public double PixelsPerDegreeLon => SpacingAt(CentreLat, .01) * 100;

        public double SpacingAt(double lat, double step) => Distance(At(CentreLon, lat), At(CentreLon + step, lat));

        public Pixel? At(double lon, double lat)
        {
            var point = Projection.Project(new LonLat(lon, lat));
            return double.IsFinite(point.X) && double.IsFinite(point.Y) ? Frame.ToPixel(point) : null;
        }

        public IEnumerable<double> Meridians(double step)
        {
            var first = (long)Math.Ceiling(((CentreLon + MinRelLon) / step) - 1e-9);
            var count = (long)Math.Floor(((CentreLon + MaxRelLon) / step) + 1e-9) - first + 1;
            return Enumerable.Range(0, (int)Math.Min(count, (long)Math.Round(360 / step))).Select(i => (first + i) * step);
        }

        public IEnumerable<double> Parallels(double step)
        {
            for (var k = (long)Math.Ceiling((MinLat / step) - 1e-9); k * step <= MaxLat; k++)
            {
                if (Math.Abs(k * step) < 90 - 1e-9)
                {
                    yield return k * step;
                }
            }
        }

        public static Window? Of(EqualAreaProjection projection, MapFrame frame)
        {
            var centre = projection.Unproject(frame.Centre);
            var positions = (
                from i in Enumerable.Range(0, Lattice + 1)
                from j in Enumerable.Range(0, Lattice + 1)
                let position = projection.Unproject(frame.ToPlane(new Pixel(frame.Width * i / Lattice, frame.Height * j / Lattice)))
                where double.IsFinite(position.Lon) && double.IsFinite(position.Lat)
                select (RelLon: Positions.Normal(position.Lon - centre.Lon), position.Lat)).ToList();
            if (positions.Count == 0 || !double.IsFinite(centre.Lon) || !double.IsFinite(centre.Lat))
            {
                return null;
            }

            var (minLon, maxLon) = (positions.Min(p => p.RelLon), positions.Max(p => p.RelLon));
            var (minLat, maxLat) = (positions.Min(p => p.Lat), positions.Max(p => p.Lat));
            var (padLon, padLat) = ((maxLon - minLon) / Lattice, (maxLat - minLat) / Lattice);
            var window = new Window(
                projection, frame, centre.Lon, centre.Lat,
                Math.Max(minLon - padLon, -180), Math.Min(maxLon + padLon, 180), Math.Max(minLat - padLat, -90), Math.Min(maxLat + padLat, 90));
            return window.ShowsPole
                ? window with { MinRelLon = -180, MaxRelLon = 180, MinLat = centre.Lat < 0 ? -90 : window.MinLat, MaxLat = centre.Lat < 0 ? window.MaxLat : 90 }
                : window;
        }

        // The pole of the other half of the Earth is on no map of a region, and may have no place in its plane.
        private bool ShowsPole => At(CentreLon, CentreLat < 0 ? -90 : 90) is { } place && Frame.Contains(place);

        // Towards the equator: a latitude beyond the pole is none.
        private double Inward(double degrees) => CentreLat > 0 ? CentreLat - degrees : CentreLat + degrees;

        private static double Distance(Pixel? a, Pixel? b) => a is { } p && b is { } q ? p.DistanceTo(q) : 0;
    }
}
