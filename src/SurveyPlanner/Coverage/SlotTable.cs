namespace SurveyPlanner.Coverage;

/// <summary>
/// Finds a place in an ascending stretch of a list at one look: the way from its first value to its last is cut into equal slots, and each slot keeps
/// its first value and the index of that. Slots with several values halve them.
/// </summary>
internal readonly struct SlotTable
{
    private readonly int _firstSlot;
    private readonly double _lastSlot;
    private readonly double _slotsPerUnit;

    private SlotTable(ReadOnlySpan<double> values, int firstSlot, int slots)
    {
        // Nothing is at most the last value where there is none.
        (First, Last) = values.IsEmpty ? (0, double.NegativeInfinity) : (values[0], values[^1]);
        (_firstSlot, _lastSlot) = (firstSlot, slots - 1);
        _slotsPerUnit = Last > First ? slots / (Last - First) : 0;
    }

    /// <summary>The first value; 0 where there is none.</summary>
    public double First { get; }

    /// <summary>The last value; minus infinity where there is none.</summary>
    public double Last { get; }

    /// <summary>A table for each stretch of a list.</summary>
    /// <param name="values">The list.</param>
    /// <param name="starts">Index of the first value of each stretch, and the number of values as last entry.</param>
    /// <param name="step">What values are mostly apart, as wide as a slot shall be; 0 where that is not known.</param>
    /// <param name="slots">Takes the slots of all tables.</param>
    public static SlotTable[] Of(double[] values, ReadOnlySpan<int> starts, double step, out Slot[] slots)
    {
        var tables = new SlotTable[starts.Length - 1];
        var total = 0;
        for (var i = 0; i < tables.Length; i++)
        {
            var stretch = values.AsSpan(starts[i]..starts[i + 1]);
            var count = SlotsFor(stretch, step);
            tables[i] = new SlotTable(stretch, total, count);
            total += count;
        }

        slots = new Slot[total];
        for (var i = 0; i < tables.Length; i++)
        {
            tables[i].Fill(values, starts[i], starts[i + 1], slots.AsSpan(0, i + 1 == tables.Length ? total : tables[i + 1]._firstSlot));
        }

        return tables;
    }

    /// <summary>Index of the first value that is at least so large; that after the last where none is.</summary>
    public int FirstFrom(Slot[] slots, double[] values, double least)
    {
        ref readonly var slot = ref slots[SlotOf(least)];
        var i = slot.First + (slot.Value < least ? 1 : 0);
        return slot.More > 0 && slot.Value < least ? FirstFrom(values, i, i + slot.More, least) : i;
    }

    /// <summary>Index of the first value that is larger; that after the last where none is.</summary>
    public int FirstBeyond(Slot[] slots, double[] values, double most)
    {
        ref readonly var slot = ref slots[SlotOf(most)];
        var i = slot.First + (slot.Value <= most ? 1 : 0);
        return slot.More > 0 && slot.Value <= most ? FirstFrom(values, i, i + slot.More, Math.BitIncrement(most)) : i;
    }

    private static int FirstFrom(double[] values, int low, int high, double least)
    {
        while (low < high)
        {
            var middle = (low + high) / 2;
            (low, high) = values[middle] < least ? (middle + 1, high) : (low, middle);
        }

        return low;
    }

    /// <summary>As many slots as values, or more where values leave gaps; but not for the sake of wide ones.</summary>
    private static int SlotsFor(ReadOnlySpan<double> values, double step)
        => step > 0 && values.Length > 1
            ? (int)Math.Clamp(Math.Ceiling((values[^1] - values[0]) / step) + 1, values.Length, 4.0 * values.Length)
            : Math.Max(1, values.Length);

    private void Fill(double[] values, int start, int end, Span<Slot> slots)
    {
        var i = start;
        for (var slot = _firstSlot; slot < slots.Length; slot++)
        {
            while (i < end && SlotOf(values[i]) < slot)
            {
                i++;
            }

            // A slot without values has none below what is looked for in it.
            ref var current = ref slots[slot];
            (current.First, current.Value) = (i, i < end ? values[i] : double.PositiveInfinity);
            while (i + current.More + 1 < end && SlotOf(values[i + current.More + 1]) == slot)
            {
                current.More++;
            }
        }
    }

    // Held between the first slot and the last while still a fraction, so that the plain conversion will do.
    private int SlotOf(double value)
        => _firstSlot + double.ConvertToIntegerNative<int>(double.MaxNative(double.MinNative((value - First) * _slotsPerUnit, _lastSlot), 0));
}

/// <summary>
/// A slot of a <see cref="SlotTable"/>: its first value and the index of it (or of the next value, where it has none), and how many more it has.
/// </summary>
internal struct Slot
{
    public double Value;
    public int First;
    public int More;
}
