namespace SurveyPlanner.Pages;

/// <summary>Writes the report: one self-contained HTML page that uses no network and no script.</summary>
public static class ReportRenderer
{
    /// <summary>
    /// The report of a plan. Equal input gives equal text, whatever the culture and time zone of the machine.
    /// Text of unknown origin (names of surveys, strata, files) is escaped.
    /// </summary>
    public static string Render(SurveyPlan plan, ReportContext context)
    {
        ArgumentNullException.ThrowIfNull(plan);
        ArgumentNullException.ThrowIfNull(context);
        return "<!DOCTYPE html>\n" + RazorText.Render<Report.ReportPage>(new()
        {
            [nameof(Report.ReportPage.Plan)] = plan,
            [nameof(Report.ReportPage.Context)] = context,
        });
    }
}
