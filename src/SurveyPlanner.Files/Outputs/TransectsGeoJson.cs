using System.Buffers;
using System.Collections.Immutable;
using System.Text.Json;
using SurveyPlanner.Regions;

namespace SurveyPlanner.Files.Outputs;

/// <summary>
/// <c>transects.geojson</c>: RFC 7946, WGS 84, 7 decimals, one Feature a transect and a line of text, cut at 180°.
/// </summary>
public static class TransectsGeoJson
{
    /// <summary>The file, each transect with the coverage along it where that was worked out.</summary>
    public static OutputFile Write(SurveyPlan plan) => new(OutputNames.TransectsGeoJson, Write(plan, withCoverage: true));

    /// <summary>
    /// The layout alone, byte for byte the same for the same transects whatever else was worked out:
    /// the file without its <c>coverage</c> properties. Its SHA-256 is the layout's hash in records and draws.
    /// </summary>
    public static ReadOnlyMemory<byte> LayoutBytes(SurveyPlan plan) => Write(plan, withCoverage: false);

    private static ReadOnlyMemory<byte> Write(SurveyPlan plan, bool withCoverage)
    {
        var transects = DrawnTransect.All(plan, withCoverage);
        var buffer = new ArrayBufferWriter<byte>();
        buffer.Write("{\"type\":\"FeatureCollection\","u8);
        if (BoundingBox.Round(transects.SelectMany(transect => transect.Parts.Select(part => (IReadOnlyList<LonLat>)part))) is { } box)
        {
            buffer.Write("\"bbox\":"u8);
            buffer.Write(JsonText.Write(json => WriteNumbers(json, box.West, box.South, box.East, box.North), indented: false).Span);
            buffer.Write(","u8);
        }

        buffer.Write("\"features\":["u8);
        for (var i = 0; i < transects.Count; i++)
        {
            buffer.Write(i == 0 ? "\n"u8 : ",\n"u8);
            buffer.Write(JsonText.Write(json => WriteFeature(json, transects[i]), indented: false).Span);
        }

        buffer.Write("\n]}\n"u8);
        return buffer.WrittenMemory;
    }

    private static void WriteFeature(Utf8JsonWriter json, DrawnTransect transect)
    {
        json.WriteStartObject();
        json.WriteString("type", "Feature");
        json.WriteString("id", transect.Id);
        json.Object("geometry", () => WriteGeometry(json, transect.IsPoint, transect.Parts));
        json.Object("properties", () =>
        {
            json.WriteString("id", transect.Id);
            json.WriteString("stratum", transect.Stratum);
            if (transect.Order is { } order)
            {
                json.WriteNumber("order", order);
            }

            if (transect.Reserve is { } reserve)
            {
                json.WriteNumber("reserve", reserve);
            }

            if (transect.LengthMetres is { } length)
            {
                json.Figure("length_m", Figures.Metres(length));
            }

            if (transect.BearingDegrees is { } bearing)
            {
                json.Figure("bearing_deg", Figures.Bearing(bearing));
            }

            if (transect.Coverage is { } coverage)
            {
                json.Figure("coverage", Figures.Significant(coverage, 6));
            }
        });
        json.WriteEndObject();
    }

    private static void WriteGeometry(Utf8JsonWriter json, bool isPoint, ImmutableArray<ImmutableArray<LonLat>> parts)
    {
        json.WriteString("type", isPoint ? "Point" : parts.Length == 1 ? "LineString" : "MultiLineString");
        json.WritePropertyName("coordinates");
        if (isPoint)
        {
            WriteNumbers(json, parts[0][0].Lon, parts[0][0].Lat);
        }
        else if (parts.Length == 1)
        {
            WriteLine(json, parts[0]);
        }
        else
        {
            json.WriteStartArray();
            foreach (var part in parts)
            {
                WriteLine(json, part);
            }

            json.WriteEndArray();
        }
    }

    private static void WriteLine(Utf8JsonWriter json, ImmutableArray<LonLat> line)
    {
        json.WriteStartArray();
        foreach (var vertex in line)
        {
            WriteNumbers(json, vertex.Lon, vertex.Lat);
        }

        json.WriteEndArray();
    }

    private static void WriteNumbers(Utf8JsonWriter json, params ReadOnlySpan<double> degrees)
    {
        json.WriteStartArray();
        foreach (var value in degrees)
        {
            json.WriteRawValue(Figures.Degrees(value), skipInputValidation: true);
        }

        json.WriteEndArray();
    }
}
