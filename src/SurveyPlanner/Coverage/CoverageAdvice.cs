namespace SurveyPlanner.Coverage;

/// <summary>What the coverage of a stratum looks like.</summary>
public enum CoverageFinding
{
    /// <summary>Nearly everywhere close to nominal.</summary>
    Even,

    /// <summary>Away from nominal near the boundary only.</summary>
    UnevenAtEdge,

    /// <summary>Away from nominal inside too, and changing along the axis: across the lines of the layout.</summary>
    UnevenAlongAxis,

    /// <summary>Away from nominal inside too, in some other way.</summary>
    UnevenInside,

    /// <summary>Not known: the simulated draws are too few to tell a cell of nominal coverage from one of half of it.</summary>
    TooFewDraws,
}

/// <summary>What a stratum's coverage means for the survey.</summary>
/// <param name="Finding">What it looks like.</param>
/// <param name="UnevenShare">Share of the area whose coverage is more than a tenth away from nominal, beyond what simulation leaves uncertain.</param>
/// <param name="NeverCoveredKm2">
/// Area of the cells that can never be covered (simulated: that none of enough draws covered), square kilometres; null where the draws are too few to tell.
/// </param>
/// <param name="Sentence">All this and what to do about it, in plain words.</param>
public sealed record CoverageAdvice(CoverageFinding Finding, double UnevenShare, double? NeverCoveredKm2, string Sentence);
