using System.Globalization;
using SurveyPlanner.Files.Records;

namespace SurveyPlanner.Cli;

/// <summary>A drawn plan on the terminal: the answer first, then aligned tables, 80 columns.</summary>
internal static class PlanText
{
    public static void Write(TextWriter output, SurveyPlan plan, DrawNumber draw)
    {
        output.WriteLine(string.Create(
            CultureInfo.InvariantCulture,
            $"{Amount(plan)} in {Amount(plan.Region.AreaKm2)} km² of {plan.Design.Name} ({draw}, seed {plan.Design.Seed})."));
        output.WriteLine();
        WriteStrata(output, plan);
        if (plan.Strata.All(stratum => stratum.Coverage is not null))
        {
            output.WriteLine();
            WriteCoverage(output, plan);
        }

        if (plan.Delivered is { } delivered)
        {
            output.WriteLine();
            output.WriteLine(EffortText.Delivered(plan.Effort!, delivered));
        }

        output.WriteLine();
    }

    public static void WriteCoverage(TextWriter output, SurveyPlan plan)
    {
        var table = new TextTable("stratum", "cells", "nominal", "mean", "least", "most", "cv", "simulated", "max |z|");
        foreach (var coverage in plan.Strata.Select(stratum => stratum.Coverage!))
        {
            table.Add(
                coverage.Stratum,
                TextTable.Number(coverage.Cells.Length),
                TextTable.Figure(coverage.Nominal),
                TextTable.Figure(coverage.Mean),
                TextTable.Figure(coverage.Min),
                TextTable.Figure(coverage.Max),
                TextTable.Figure(coverage.Cv),
                TextTable.Figure(coverage.SimulatedMean),
                coverage.MaxAbsZ is { } z ? TextTable.Figure(z) : "no exact");
        }

        output.WriteLine("Coverage probability");
        table.Write(output);
        foreach (var coverage in plan.Strata.Select(stratum => stratum.Coverage!).Where(coverage => coverage.Advice is not null))
        {
            var name = plan.Strata.Length == 1 ? "" : string.Concat(coverage.Stratum.Where(c => !char.IsControl(c))) + ": ";
            output.WriteLine(name + coverage.Advice!.Sentence);
        }
    }

    public static void WriteTransects(TextWriter output, SurveyPlan plan)
    {
        var table = new TextTable("id", "stratum", "start lat", "start lon", "end lat", "end lon", "km", "bearing");
        foreach (var stratum in plan.Strata)
        {
            foreach (var transect in stratum.Layout.Transects)
            {
                table.Add(
                    transect.Id,
                    stratum.Stratum.Name,
                    TextTable.Degrees(transect.Start.Lat),
                    TextTable.Degrees(transect.Start.Lon),
                    TextTable.Degrees(transect.End.Lat),
                    TextTable.Degrees(transect.End.Lon),
                    TextTable.Figure(transect.LengthMetres / 1000),
                    transect.BearingDegrees is { } bearing ? TextTable.Bearing(bearing, 360) : "");
            }
        }

        table.Write(output);
    }

    private static void WriteStrata(TextWriter output, SurveyPlan plan)
    {
        var table = new TextTable("stratum", "km²", "kind", "bearing", "spacing km", "transects", "km", "expected km");
        foreach (var (stratum, layout) in plan.Strata.Select(one => (one.Stratum, one.Layout)))
        {
            var (points, scattered) = (layout.Design.IsPoints, layout.Design.IsScattered);
            table.Add(
                stratum.Name,
                TextTable.Figure(stratum.AreaKm2),
                ChoiceWord.Of(layout.Design.Kind),
                scattered ? "" : TextTable.Bearing(layout.BearingDegrees, 180),
                scattered ? "" : TextTable.Figure(layout.SpacingMetres / 1000),
                TextTable.Number(layout.Transects.Length),
                points ? "" : TextTable.Figure(layout.TotalLengthMetres / 1000),
                layout.ExpectedLengthMetres is { } expected ? TextTable.Figure(expected / 1000) : "");
        }

        table.Write(output);
    }

    /// <summary>One decimal for what is large, three figures for what is small.</summary>
    private static string Amount(double value) => value >= 100 ? value.ToString("#,0.0", CultureInfo.InvariantCulture) : TextTable.Figure(value);

    private static string Amount(SurveyPlan plan)
    {
        var layouts = plan.Strata.Select(stratum => stratum.Layout).ToList();
        var points = layouts.Where(layout => layout.Design.IsPoints).Sum(layout => layout.Transects.Length);
        var lines = layouts.Where(layout => !layout.Design.IsPoints).Sum(layout => layout.Transects.Length);
        var km = layouts.Sum(layout => layout.TotalLengthMetres) / 1000;
        var parts = new List<string>();
        if (lines > 0 || points == 0)
        {
            parts.Add(string.Create(CultureInfo.InvariantCulture, $"{lines} {(lines == 1 ? "transect" : "transects")}, {Amount(km)} km"));
        }

        if (points > 0)
        {
            parts.Add(string.Create(CultureInfo.InvariantCulture, $"{points} {(points == 1 ? "point" : "points")}"));
        }

        return string.Join(" and ", parts);
    }
}
