namespace FiberScope.Specimens.Mats;

/// <summary>A mat laid out in pixels: fibres from the top down, and what else lies in it.</summary>
internal sealed record MatModel(MatScale Scale, FibreCurve[] Fibres, SolidBody[] Bodies, FilmPatch[] Films, RopeStretch[] Ropes);

/// <summary>Where a rope's fibres touch: the leader's nodes and how far the rope reaches to either side; pixels.</summary>
internal sealed record RopeStretch(int Group, FibreNode[] Leader, double Left, double Right);
