using SurveyPlanner.Files.CoordinateSystems;

namespace SurveyPlanner.Files.Boundaries;

/// <summary>Which coordinate system a file is read in: what it says itself, or what the user says for it, never one against the other.</summary>
internal static class ChosenSystem
{
    // Some describe a datum's shift better than others; a survey does not notice this.
    private const double MostDisagreementMetres = 10;

    public static (CoordinateSystem System, string Origin) Of(RawBoundary raw, string source, BoundaryOptions options)
    {
        if (options.Crs is not { } crs)
        {
            return raw.System is { } declared ? (declared, raw.SystemOrigin) : throw CoordinateCheck.Undeclared(raw, source);
        }

        var asked = SystemNames.Find(crs) ?? throw new InputException(new Problem(
            $"the coordinate system {Wording.Quote(crs)} is not known here; give an EPSG code that is listed in docs/methods/coordinate-systems.md, or save the boundary in WGS 84 (EPSG:4326)",
            Key: "region.crs"));
        if (raw.System is { } own && !raw.SystemIsDefault && SystemAgreement.Metres(own, asked, raw.Features) is var apart && !(apart <= MostDisagreementMetres))
        {
            throw FileBytes.Refusal(
                source,
                $"the file says that its coordinate system is {own.Name} ({raw.SystemOrigin}), but crs in [region] says {asked.Name}, {Wording.Length(apart)} apart here; leave crs out, or correct the file");
        }

        return (asked, "crs in [region]");
    }
}
