using FiberScope.Specimens.Numbers;

namespace FiberScope.Specimens;

/// <summary>Makes pictures of one family differ as pictures do: another operator, another coating, another focus.</summary>
public static class SpecimenVariation
{
    /// <summary>
    /// The recipe with its look and instrument changed at random: rims from 0.4 to 1.6 times as high, blur by ±15 %, electrons by ±30 %,
    /// shading, shadows, glow, black level and clipping likewise. The mat stays as it is.
    /// </summary>
    /// <param name="recipe">The family's recipe.</param>
    /// <param name="seed">Fixes the changes.</param>
    public static SpecimenRecipe Of(SpecimenRecipe recipe, ulong seed)
    {
        var random = new SeededRandom(seed, 91);
        var (look, camera, light) = (recipe.Electrons, recipe.Camera, recipe.Light);
        return recipe with
        {
            Electrons = look with
            {
                RimHeight = look.RimHeight * random.Between(0.4, 1.6),
                RimExponent = random.Between(0.7, 1.1),
                RimCap = random.Between(2.2, 4),
                Dome = look.Dome * random.Between(0, 2.5),
                Asymmetry = look.Asymmetry * random.Between(0, 2),
                ShadingDepth = look.ShadingDepth * random.Between(0.75, 1.4),
                DeepBrightness = Math.Min(0.6, look.DeepBrightness * random.Between(0.6, 1.5)),
                CreviceShadow = look.CreviceShadow * random.Between(0.6, 1.4),
                Translucency = look.Translucency * random.Between(0.3, 1.8),
                Glow = look.Glow * random.Between(0.5, 1.6),
            },
            Camera = camera with
            {
                BlurPixels = camera.BlurPixels * random.Between(0.85, 1.15),
                DefocusPixels = camera.DefocusPixels * random.Between(0.6, 1.4),
                FocusDepth = random.Between(0.2, 0.9),
                ElectronsPerPixel = camera.ElectronsPerPixel * random.Between(0.7, 1.3),
                BlackLevel = camera.BlackLevel + random.Between(-0.015, 0.03),
                ClippedShare = camera.ClippedShare * random.Between(0.4, 2.5),
            },
            Light = light with
            {
                Rim = light.Rim * random.Between(0.7, 1.5),
                CoreWidth = Math.Clamp(light.CoreWidth * random.Between(0.85, 1.15), 0.1, 0.9),
                DefocusPixels = light.DefocusPixels * random.Between(0.7, 1.4),
            },
        };
    }
}
