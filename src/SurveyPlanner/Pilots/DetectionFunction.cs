namespace SurveyPlanner.Pilots;

/// <summary>
/// The chance g of seeing an animal at a distance, 1 at distance 0. Distances in metres.
/// References: Buckland and others 2001, Introduction to Distance Sampling, chapters 2 and 3 (from memory); the closed forms of the
/// effective widths were derived apart and checked by quadrature to 1e-13.
/// </summary>
public abstract record DetectionFunction
{
    /// <summary>The model it belongs to.</summary>
    public abstract DetectionModel Model { get; }

    /// <summary>Its parameters by name, in the order of the model.</summary>
    public abstract IReadOnlyList<(string Name, double Value)> Parameters { get; }

    /// <summary>g at a distance of 0 or more.</summary>
    public abstract double ProbabilityAt(double metres);

    /// <summary>μ = ∫ g dx from 0 to the truncation distance: the effective strip half-width. The truncation distance may be infinite where the integral is finite.</summary>
    public abstract double EffectiveHalfWidth(double truncationMetres);

    /// <summary>ρ² = 2 ∫ r g dr from 0 to the truncation distance, the square of the effective radius.</summary>
    public abstract double EffectiveRadiusSquared(double truncationMetres);

    /// <summary>ρ, the effective radius.</summary>
    public double EffectiveRadius(double truncationMetres) => Math.Sqrt(EffectiveRadiusSquared(truncationMetres));

    /// <summary>What a density is divided by: μ for lines, ρ² for points.</summary>
    internal double Effective(double truncationMetres, bool isPoints)
        => isPoints ? EffectiveRadiusSquared(truncationMetres) : EffectiveHalfWidth(truncationMetres);
}
