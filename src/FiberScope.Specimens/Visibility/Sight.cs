using FiberScope.Specimens.Mats;
using FiberScope.Specimens.Rendering;

namespace FiberScope.Specimens.Visibility;

/// <summary>Walks along a fibre and tells where it can be seen, and where both its edges can.</summary>
internal sealed class Sight(MatModel mat, Scene scene, float[] grey)
{
    private const double EdgeDrop = 0.12, NoiseTimesVisible = 3, NoiseTimesEdge = 2;

    private readonly int _width = mat.Scale.Width, _height = mat.Scale.Height;
    private readonly CameraRecipe _camera = mat.Scale.Recipe.Camera;

    /// <summary>The visible points of a fibre, and the depth of the deepest below the mat's top (pixels).</summary>
    public (List<TrueStation> Stations, double Deepest) Stations(int fibre)
    {
        var nodes = mat.Fibres[fibre].Nodes;
        var stations = new List<TrueStation>();
        var (deepest, step) = (0.0, Math.Clamp(mat.Fibres[fibre].Diameter / 4, 1, 4));
        for (var i = 1; i < nodes.Length; i++)
        {
            var (a, b) = (nodes[i - 1], nodes[i]);
            var (dx, dy) = (b.X - a.X, b.Y - a.Y);
            var length = Math.Sqrt((dx * dx) + (dy * dy));
            if (length <= 0 || Math.Max(a.X, b.X) < 0 || Math.Max(a.Y, b.Y) < 0 || Math.Min(a.X, b.X) > _width || Math.Min(a.Y, b.Y) > _height)
            {
                continue;
            }

            var pieces = Math.Max(1, (int)Math.Ceiling(length / step));
            for (var p = 0; p < pieces; p++)
            {
                var share = (p + 0.5) / pieces;
                var place = new Place(a.X + (share * dx), a.Y + (share * dy), -dy / length, dx / length, a.Radius + (share * (b.Radius - a.Radius)));
                if (Visible(fibre, place))
                {
                    var depth = mat.Scale.LaidDepth - (a.Z + (share * (b.Z - a.Z)));
                    deepest = Math.Max(deepest, depth);
                    var direction = Math.Atan2(dy, dx);
                    direction = direction < 0 ? direction + Math.PI : direction;
                    var edges = BothEdges(fibre, place, scene.SigmaAt(depth / mat.Scale.MeanDepth));
                    stations.Add(new(fibre, (float)(place.X - Shift(place.Y)), (float)place.Y, (float)direction, (float)(2 * place.Radius), (float)(length / pieces), edges));
                }
            }
        }

        return (stations, deepest);
    }

    private bool Visible(int fibre, Place place)
    {
        if (Top(place.X, place.Y) != fibre)
        {
            return false;
        }

        var signal = Signal(place.X, place.Y);
        return signal >= SpecimenTruth.VisibleSignal && signal >= NoiseTimesVisible * Noise(signal) / (2 * place.Radius);
    }

    private bool BothEdges(int fibre, Place place, double sigma) =>
        Edge(fibre, place, sigma, 1) && Edge(fibre, place, sigma, -1);

    private bool Edge(int fibre, Place place, double sigma, int side)
    {
        double X(double offset) => place.X + (side * offset * place.NormalX);
        double Y(double offset) => place.Y + (side * offset * place.NormalY);
        var beyond = place.Radius + Math.Max(1, 1.5 * sigma);
        if (!Inside(X(beyond), Y(beyond)) || Top(X(0.7 * place.Radius), Y(0.7 * place.Radius)) != fibre)
        {
            return false;
        }

        // Fibres are numbered from the top down: what lies outside must be lower, and no defect.
        var outside = Top(X(beyond), Y(beyond));
        if (outside < TileRaster.Ground || (outside >= 0 && outside <= fibre))
        {
            return false;
        }

        var within = 0.0;
        for (var u = 0.3; u <= 0.95; u += 0.2)
        {
            within = Math.Max(within, Signal(X(u * place.Radius), Y(u * place.Radius)));
        }

        var fall = within - Signal(X(beyond), Y(beyond));
        return fall >= EdgeDrop * within && fall >= NoiseTimesEdge * Noise(within) / Math.Sqrt(4 * place.Radius);
    }

    private double Noise(double signal) => _camera.ElectronsPerPixel > 0
        ? Math.Sqrt((signal / _camera.ElectronsPerPixel) + (_camera.ReadNoise * _camera.ReadNoise))
        : _camera.ReadNoise;

    private double Shift(double y) => scene.LineShift[Math.Clamp((int)y, 0, _height - 1)];

    private bool Inside(double x, double y) => x - Shift(y) is var column && column >= 0 && column < _width && y >= 0 && y < _height;

    private int Top(double x, double y)
    {
        if (!Inside(x, y))
        {
            return int.MinValue;
        }

        return scene.TopFibre[((int)y * _width) + (int)(x - Shift(y))];
    }

    private double Signal(double x, double y)
    {
        var (px, py) = (Math.Clamp(x - Shift(y) - 0.5, 0, _width - 1.001), Math.Clamp(y - 0.5, 0, _height - 1.001));
        var (ix, iy) = ((int)px, (int)py);
        var (fx, fy) = (px - ix, py - iy);
        var index = (iy * _width) + ix;
        var top = grey[index] + (fx * (grey[index + 1] - grey[index]));
        var bottom = grey[index + _width] + (fx * (grey[index + _width + 1] - grey[index + _width]));
        return top + (fy * (bottom - top)) - _camera.BlackLevel;
    }

    private readonly record struct Place(double X, double Y, double NormalX, double NormalY, double Radius);
}
