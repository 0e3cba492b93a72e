namespace SurveyPlanner.Coverage;

/// <summary>
/// Finds a place in an ascending stretch of a list in a step or two where it is spread fairly evenly: the way from first to last value is cut into
/// as many equal slots as there are values, and for each slot it is noted which value is its first. Where values crowd, it halves.
/// </summary>
internal readonly struct SlotTable
{
    private readonly int _start;
    private readonly int _end;
    private readonly double _slotsPerUnit;
    private readonly double _lastSlot;

    /// <param name="slots">The list; takes, in the same stretch, the index of the first value of each slot or a later one.</param>
    /// <param name="start">Index of the first value of the stretch.</param>
    /// <param name="end">Index after its last.</param>
    public SlotTable(Slot[] slots, int start, int end)
    {
        (_start, _end) = (start, end);
        if (start == end)
        {
            // Nothing is at least or at most what it would have to be.
            (First, Last) = (double.PositiveInfinity, double.NegativeInfinity);
            return;
        }

        (First, Last) = (slots[start].Value, slots[end - 1].Value);
        _slotsPerUnit = Last > First ? (end - start) / (Last - First) : 0;
        _lastSlot = end - start - 1;
        var i = start;
        for (var slot = start; slot < end; slot++)
        {
            while (SlotOf(slots[i].Value) < slot)
            {
                i++;
            }

            slots[slot].First = i;
        }
    }

    /// <summary>The first value; infinite where there is none.</summary>
    public double First { get; }

    /// <summary>The last value; minus infinity where there is none.</summary>
    public double Last { get; }

    /// <summary>Index of the first value that is at least so large; the end where none is.</summary>
    public int FirstFrom(Slot[] slots, double least) => least <= Last ? Find(slots, least) : _end;

    /// <summary>Index of the first value that is larger; the end where none is.</summary>
    public int FirstBeyond(Slot[] slots, double most)
    {
        if (!(most < Last))
        {
            return _end;
        }

        var i = Find(slots, most);
        while (slots[i].Value == most)
        {
            i++;
        }

        return i;
    }

    /// <summary>Index of the first value that is at least so large as a number that is not larger than the last.</summary>
    private int Find(Slot[] slots, double number)
    {
        var slot = SlotOf(number);
        var i = slots[slot].First;

        // Mostly one to go or none, which no branch would foretell.
        i += slots[i].Value < number ? 1 : 0;
        return slots[i].Value < number ? Halve(slots, i, slot + 1 < _end ? slots[slot + 1].First : _end, number) : i;
    }

    /// <summary>The same, known to lie behind <paramref name="low"/> and at most at <paramref name="high"/>.</summary>
    private static int Halve(Slot[] slots, int low, int high, double number)
    {
        while (high - low > 1)
        {
            var middle = (low + high) / 2;
            (low, high) = slots[middle].Value < number ? (middle, high) : (low, middle);
        }

        return high;
    }

    // Held between the first slot and the last while still a fraction, so that the plain conversion will do.
    private int SlotOf(double value)
        => _start + double.ConvertToIntegerNative<int>(double.MaxNative(double.MinNative((value - First) * _slotsPerUnit, _lastSlot), 0));
}

/// <summary>A value of a list and, for the slot of the same number, the index of its first value: side by side, since they are looked up together.</summary>
internal struct Slot
{
    public double Value;
    public int First;

    public static Slot[] Of(double[] values) => Array.ConvertAll(values, value => new Slot { Value = value });
}
