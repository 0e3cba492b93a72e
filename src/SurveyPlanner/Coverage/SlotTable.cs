namespace SurveyPlanner.Coverage;

/// <summary>
/// Finds a place in an ascending list in a step or two where the list is spread fairly evenly: the stretch from first to last value is cut into
/// as many equal slots as there are values, and for each slot it is noted which value is its first. Where values crowd, it halves.
/// </summary>
internal readonly struct SlotTable
{
    // So few are looked through one by one: quicker than halving.
    private const int Few = 8;

    private readonly double _first;
    private readonly double _last;
    private readonly double _slotsPerUnit;

    /// <param name="values">Ascending.</param>
    /// <param name="firsts">As many as values: takes the index of the first value of each slot or a later one.</param>
    public SlotTable(ReadOnlySpan<double> values, Span<int> firsts)
    {
        if (values.Length == 0)
        {
            return;
        }

        (_first, _last) = (values[0], values[^1]);
        _slotsPerUnit = _last > _first ? values.Length / (_last - _first) : 0;
        var i = 0;
        for (var slot = 0; slot < firsts.Length; slot++)
        {
            while (i < values.Length && Slot(values[i], values.Length) < slot)
            {
                i++;
            }

            firsts[slot] = i;
        }
    }

    /// <summary>Index of the first value that is at least so large; the number of values where none is.</summary>
    public int FirstFrom(ReadOnlySpan<double> values, ReadOnlySpan<int> firsts, double least)
    {
        if (values.Length == 0 || least <= _first)
        {
            return 0;
        }

        if (least > _last)
        {
            return values.Length;
        }

        var slot = Slot(least, values.Length);
        var i = firsts[slot];
        for (var end = slot + 1 < firsts.Length ? firsts[slot + 1] : values.Length; end - i > Few;)
        {
            var middle = (i + end) / 2;
            (i, end) = values[middle] < least ? (middle + 1, end) : (i, middle);
        }

        while (values[i] < least)
        {
            i++;
        }

        return i;
    }

    /// <summary>Index of the first value that is larger; the number of values where none is.</summary>
    public int FirstBeyond(ReadOnlySpan<double> values, ReadOnlySpan<int> firsts, double most)
        => most >= _last ? values.Length : FirstFrom(values, firsts, Math.BitIncrement(most));

    private int Slot(double value, int slots) => Math.Min((int)((value - _first) * _slotsPerUnit), slots - 1);
}
