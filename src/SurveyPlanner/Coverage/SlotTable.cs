namespace SurveyPlanner.Coverage;

/// <summary>
/// Finds a place in an ascending list in a step or two where the list is spread fairly evenly: the stretch from first to last value is cut into
/// as many equal slots as there are values, and for each slot it is noted which value is its first. Where values crowd, it halves.
/// </summary>
internal readonly struct SlotTable
{
    private readonly double _slotsPerUnit;

    /// <param name="values">Ascending.</param>
    /// <param name="firsts">As many as values: takes the index of the first value of each slot or a later one.</param>
    public SlotTable(ReadOnlySpan<double> values, Span<int> firsts)
    {
        if (values.Length == 0)
        {
            // Nothing is at least or at most what it would have to be.
            (First, Last) = (double.PositiveInfinity, double.NegativeInfinity);
            return;
        }

        (First, Last) = (values[0], values[^1]);
        _slotsPerUnit = Last > First ? values.Length / (Last - First) : 0;
        var i = 0;
        for (var slot = 0; slot < firsts.Length; slot++)
        {
            while (Slot(values[i], values.Length) < slot)
            {
                i++;
            }

            firsts[slot] = i;
        }
    }

    /// <summary>The first value; infinite where there is none.</summary>
    public double First { get; }

    /// <summary>The last value; minus infinity where there is none.</summary>
    public double Last { get; }

    /// <summary>Index of the first value that is at least so large; the number of values where none is.</summary>
    public int FirstFrom(ReadOnlySpan<double> values, ReadOnlySpan<int> firsts, double least)
        => least <= Last ? CountBelow(values, firsts, least) : values.Length;

    /// <summary>Index of the first value that is larger; the number of values where none is.</summary>
    public int FirstBeyond(ReadOnlySpan<double> values, ReadOnlySpan<int> firsts, double most)
        => most < Last ? CountBelow(values, firsts, Math.BitIncrement(most)) : values.Length;

    /// <summary>How many values are less than a number that is not larger than the last.</summary>
    private int CountBelow(ReadOnlySpan<double> values, ReadOnlySpan<int> firsts, double number)
    {
        var slot = Slot(number, values.Length);
        var i = firsts[slot];

        // Mostly one to go or none, which no branch would foretell.
        i += values[i] < number ? 1 : 0;
        return values[i] < number ? CountBelowFrom(i, slot + 1 < firsts.Length ? firsts[slot + 1] : values.Length, values, number) : i;
    }

    /// <summary>The same, known to be more than <paramref name="low"/> and at most <paramref name="high"/>.</summary>
    private static int CountBelowFrom(int low, int high, ReadOnlySpan<double> values, double number)
    {
        while (high - low > 1)
        {
            var middle = (low + high) / 2;
            (low, high) = values[middle] < number ? (middle, high) : (low, middle);
        }

        return high;
    }

    private int Slot(double value, int slots) => Math.Clamp((int)((value - First) * _slotsPerUnit), 0, slots - 1);
}
