namespace SurveyPlanner.Regions;

/// <summary>A vertex of an outline.</summary>
/// <param name="Lat">Latitude, degrees.</param>
/// <param name="East">Degrees east of the region's meridian.</param>
/// <param name="Lon">Longitude as the outline has it.</param>
/// <param name="Polygon">Index of its polygon.</param>
internal readonly record struct BorderVertex(double Lat, double East, double Lon, int Polygon);

/// <summary>Vertices in rows of tiles, some four a tile on average, so that only those near an edge are looked at.</summary>
internal sealed class VertexTiles
{
    private const int VerticesPerTile = 4;

    private readonly BorderVertex[] _vertices;
    private readonly int[] _tileStarts;
    private readonly int _side;
    private readonly double _south;
    private readonly double _west;
    private readonly double _rowsPerDegree;
    private readonly double _columnsPerDegree;

    public VertexTiles(IReadOnlyList<BorderVertex> vertices)
    {
        double south = 90, north = -90, west = 180, east = -180;
        foreach (var vertex in vertices)
        {
            (south, north) = (Math.Min(south, vertex.Lat), Math.Max(north, vertex.Lat));
            (west, east) = (Math.Min(west, vertex.East), Math.Max(east, vertex.East));
        }

        _side = 1 + (int)Math.Sqrt(vertices.Count / VerticesPerTile);
        (_south, _west) = (south, west);
        _rowsPerDegree = _side / Math.Max(north - south, double.Epsilon);
        _columnsPerDegree = _side / Math.Max(east - west, double.Epsilon);

        // A counting sort: how many go into each tile, where each tile then begins, and each vertex to its place.
        _tileStarts = new int[(_side * _side) + 1];
        foreach (var vertex in vertices)
        {
            _tileStarts[Tile(vertex) + 1]++;
        }

        for (var tile = 0; tile < _side * _side; tile++)
        {
            _tileStarts[tile + 1] += _tileStarts[tile];
        }

        var next = _tileStarts.AsSpan(0, _side * _side).ToArray();
        _vertices = new BorderVertex[vertices.Count];
        foreach (var vertex in vertices)
        {
            _vertices[next[Tile(vertex)]++] = vertex;
        }
    }

    /// <summary>The row of a latitude; the nearest where there is none.</summary>
    public int Row(double lat) => Step((lat - _south) * _rowsPerDegree);

    /// <summary>The vertices of a row's tiles from one longitude to another; some lie a little outside.</summary>
    public ReadOnlySpan<BorderVertex> Between(int row, double low, double high)
        => _vertices.AsSpan(_tileStarts[(row * _side) + Column(low)].._tileStarts[(row * _side) + Column(high) + 1]);

    private int Column(double east) => Step((east - _west) * _columnsPerDegree);

    private int Tile(BorderVertex vertex) => (Row(vertex.Lat) * _side) + Column(vertex.East);

    // Not a number where all vertices lie on one line and the place does too: any tile will do, as long as it is always the same.
    private int Step(double tiles) => tiles > 0 ? (int)Math.Min(tiles, _side - 1) : 0;
}
