using System.Collections.Immutable;
using System.Globalization;
using SurveyPlanner.Files.Folders;
using SurveyPlanner.Files.Outputs;

namespace SurveyPlanner.Files.Records;

/// <summary>What a replay came to.</summary>
/// <param name="IsSameLayout">Whether every transect is the same to the last written digit.</param>
/// <param name="LayoutSha256">Hash of the layout now.</param>
/// <param name="ChangedOutputs">Names of files that were written then and would come out different now, or not at all.</param>
public sealed record ReplayResult(bool IsSameLayout, string LayoutSha256, ImmutableArray<string> ChangedOutputs);

/// <summary>The file side of re-creating a layout from its record.</summary>
public static class Replay
{
    /// <summary>
    /// The folder from which every input's recorded path leads to the same bytes: where the plan file was, seen from the record;
    /// else the folder of the record itself; or the one that is given.
    /// </summary>
    /// <param name="record">The record.</param>
    /// <param name="recordFile">The file it was read from.</param>
    /// <param name="folder">Where to look instead; null for the recorded places.</param>
    /// <exception cref="InputException">Says of each input that it has changed or cannot be found.</exception>
    public static string FindInputs(SurveyRecord record, string recordFile, string? folder = null)
    {
        var recordFolder = Path.GetDirectoryName(Path.GetFullPath(recordFile))!;
        var planFolder = Path.GetDirectoryName(Path.GetFullPath(Path.Combine(recordFolder, record.Plan.File))) ?? recordFolder;
        string[] places = folder is null ? [planFolder, recordFolder] : [Path.GetFullPath(folder)];
        List<Problem>? fewest = null;
        foreach (var place in places)
        {
            var problems = Problems(record, recordFile, place);
            if (problems.Count == 0)
            {
                return place;
            }

            fewest = fewest is null || problems.Count < fewest.Count ? problems : fewest;
        }

        throw new InputException(fewest!);
    }

    /// <summary>
    /// Holds what was read against the record once more: a file may change between being looked at and being read, and one that was not
    /// there when the record was made (a shapefile's companion) may say something else.
    /// </summary>
    /// <param name="record">The record.</param>
    /// <param name="read">The inputs as they were read.</param>
    /// <exception cref="InputException">Names each input that is not the recorded one.</exception>
    public static void RequireRecorded(SurveyRecord record, ImmutableArray<InputFile> read)
    {
        var strangers = read.Where(input => !record.Inputs.Any(known => known.Path == input.Path && known.Sha256 == input.Sha256)).ToList();
        if (strangers.Count > 0)
        {
            throw new InputException([.. strangers.Select(input => new Problem(
                record.Inputs.Any(known => known.Path == input.Path)
                    ? "This input changed while it was being read; bring back the recorded file and replay again."
                    : "This input is read along with the others but was not there when the record was made; move it away and replay again.",
                input.Path,
                Key: input.Key))]);
        }
    }

    /// <summary>Holds what was made again against the record.</summary>
    /// <param name="record">The record.</param>
    /// <param name="plan">The plan made again from it.</param>
    /// <param name="outputs">Its files made again, without the record.</param>
    public static ReplayResult Compare(SurveyRecord record, SurveyPlan plan, IEnumerable<OutputFile> outputs)
    {
        var layout = Hashes.Sha256(TransectsGeoJson.LayoutBytes(plan).Span);
        var now = outputs.ToDictionary(output => output.Name, output => output.Sha256, StringComparer.Ordinal);
        return new ReplayResult(
            layout == record.LayoutSha256,
            layout,
            [.. record.Outputs.Where(output => now.GetValueOrDefault(output.Name) != output.Sha256).Select(output => output.Name)]);
    }

    private static List<Problem> Problems(SurveyRecord record, string recordFile, string place) =>
        [.. record.Inputs.Select(input => Problem(input, recordFile, place)).OfType<Problem>()];

    private static Problem? Problem(InputFile input, string recordFile, string place)
    {
        var path = Path.Combine(place, input.Path);
        var file = new FileInfo(path);
        if (!file.Exists)
        {
            return new Problem($"The input '{input.Path}' is not in {place}; put it there, or say where the inputs are.", recordFile, Key: input.Key);
        }

        // Length first: it answers for most changes, and nothing that is no plain file is opened.
        var isSame = file.Length == input.Bytes && Hashes.Sha256(Bytes(path)) == input.Sha256;
        return isSame ? null : new Problem(
            $"The input '{input.Path}' in {place} has changed since the record was made ({Length(input.Bytes)}, now {Length(file.Length)}); bring back the file with SHA-256 {input.Sha256}.",
            recordFile,
            Key: input.Key);
    }

    private static byte[] Bytes(string path)
    {
        try
        {
            return File.ReadAllBytes(path);
        }
        catch (Exception exception) when (DiskTrouble.Is(exception))
        {
            throw DiskTrouble.Unread(path, exception);
        }
    }

    private static string Length(long bytes) => bytes.ToString(CultureInfo.InvariantCulture) + " bytes";
}
