using SurveyPlanner.Coverage;
using SurveyPlanner.Layouts;
using SurveyPlanner.Numerics;

namespace SurveyPlanner.Tests.Layouts;

/// <summary>What simulation asks of every kind: the same result on any number of threads, and draws that allocate nothing.</summary>
public class SimulationOfKindsTests
{
    [Theory]
    [MemberData(nameof(EveryKind.Names), MemberType = typeof(EveryKind))]
    public void The_number_of_threads_changes_nothing(string kind)
    {
        var generator = LayoutKinds.Prepare(EveryKind.Islands, EveryKind.Designs[kind]);
        var grid = CellGridBuilder.Build(generator.Stratum.Region, 500);
        var one = CoverageSimulation.Run(generator, grid, 100, seed: 3, stratum: 0, threads: 1, CancellationToken.None);
        var three = CoverageSimulation.Run(generator, grid, 100, seed: 3, stratum: 0, threads: 3, CancellationToken.None);
        Assert.Equal(one.Draws, three.Draws);
        Assert.Equal(one.Times, three.Times);
        Assert.Equal(one.Again, three.Again);
    }

    [Theory]
    [MemberData(nameof(EveryKind.Names), MemberType = typeof(EveryKind))]
    public void Drawing_again_allocates_nothing(string kind)
    {
        var generator = LayoutKinds.Prepare(EveryKind.Islands, EveryKind.Designs[kind]);
        var (buffer, offsets) = (new PieceBuffer(), new double[generator.OffsetRanges.Length]);
        void Draw(uint replicate)
        {
            var random = new PhiloxStream(1, 99, 0, replicate);
            for (var axis = 0; axis < offsets.Length; axis++)
            {
                offsets[axis] = random.NextDouble();
            }

            buffer.Clear();
            generator.Realise(offsets, ref random, buffer);
        }

        // Once through all draws: buffers grow, and whatever is computed when first asked for is.
        var before = 0L;
        for (var round = 0; round < 2; round++)
        {
            before = GC.GetAllocatedBytesForCurrentThread();
            for (var replicate = 0u; replicate < 200; replicate++)
            {
                Draw(replicate);
            }
        }

        Assert.Equal(0, GC.GetAllocatedBytesForCurrentThread() - before);
    }
}
