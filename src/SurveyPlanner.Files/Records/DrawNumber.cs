namespace SurveyPlanner.Files.Records;

/// <summary>A drawn layout as it is counted: the plan without its seed, the seed, and what came out.</summary>
/// <param name="PlanSha256">SHA-256 of the plan as understood, its seed left out, so that all seeds of a plan count together.</param>
/// <param name="Seed">The seed.</param>
/// <param name="LayoutSha256">SHA-256 of <see cref="Outputs.TransectsGeoJson.LayoutBytes"/>.</param>
/// <param name="Reason">Why it was drawn again, if that was said.</param>
public sealed record Draw(string PlanSha256, ulong Seed, string LayoutSha256, string? Reason = null);

/// <summary>Which draw it is. Choosing among draws until one pleases is no longer a random sample, so they are counted.</summary>
/// <param name="Number">From 1, among the draws of the same plan.</param>
/// <param name="Of">Draws of the same plan so far.</param>
/// <param name="AllFromPlanFile">Draws so far of whatever the plan file has said.</param>
/// <param name="Reason">Why it was drawn again, if that was said.</param>
public sealed record DrawNumber(int Number, int Of, int AllFromPlanFile, string? Reason = null)
{
    /// <summary>Such as <c>draw 2 of 3</c>.</summary>
    public override string ToString() => FormattableString.Invariant($"draw {Number} of {Of}");
}
