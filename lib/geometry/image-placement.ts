import type { GridPoint } from "./point";
import { fitSiteGrid, type Residual, type SiteGrid, toNational, toSite } from "./site-grid";

/** A point known on an image, in pixels from its upper left corner, and on the site grid. */
export type ImagePoint = { x_px: number; y_px: number; easting_m: number; northing_m: number };

/** An image laid on the site grid, undistorted: its pixels are squares of one size. */
export type ImagePlacement = {
  metresPerPixel: number;
  /** How far the image's right-hand direction is turned anticlockwise from grid east. */
  rotation_deg: number;
  /** What the points leave over, in metres; all zero with two points, which prove nothing. */
  residuals: Residual[];
  fit: SiteGrid;
};

/** Places an image by two or more points known on it and on the site grid; a problem is told in a sentence. */
export function placeImage(points: readonly ImagePoint[]): ImagePlacement | { problem: string } {
  if (points.length < 2) return { problem: "An image is placed by two points known on it and on the grid." };
  const fitted = fitSiteGrid(
    points.map(({ x_px, y_px, easting_m, northing_m }, index) => ({
      name: `Point ${index + 1}`,
      // Pixels count downwards, northings upwards.
      site: [x_px, -y_px],
      national: [easting_m, northing_m],
    })),
  );
  if ("problem" in fitted)
    return {
      problem:
        "The points must lie apart from each other, on the image and on the grid, each with both numbers.",
    };
  const { grid, residuals } = fitted;
  return { metresPerPixel: grid.scale, rotation_deg: grid.rotation_deg, residuals, fit: grid };
}

/** The point of the grid under a pixel. */
export const gridOfPixel = (placement: ImagePlacement, x_px: number, y_px: number): GridPoint =>
  toNational(placement.fit, [x_px, -y_px]);

/** The pixel over a point of the grid. */
export function pixelOfGrid(placement: ImagePlacement, point: GridPoint): { x_px: number; y_px: number } {
  const [x, y] = toSite(placement.fit, point);
  return { x_px: x, y_px: -y };
}

/** Where the corners of the image come to lie: upper left, upper right, lower right, lower left. */
export function imageCorners(
  placement: ImagePlacement,
  size: { width_px: number; height_px: number },
): [GridPoint, GridPoint, GridPoint, GridPoint] {
  const { width_px, height_px } = size;
  return [
    gridOfPixel(placement, 0, 0),
    gridOfPixel(placement, width_px, 0),
    gridOfPixel(placement, width_px, height_px),
    gridOfPixel(placement, 0, height_px),
  ];
}
