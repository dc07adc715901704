/** Where things stand in the chart [px]; shared by what lays it out and what draws it. */
export const CHART_HEIGHT = 264;
/** Temperatures drawn [°C], unless a measured point or a limit lies outside. */
export const COLDEST = -30;
export const WARMEST = 150;
/** To the right stand the names of the lines. */
export const MARGIN = { top: 8, right: 112, bottom: 4, left: 0 };
export const Y_AXIS_WIDTH = 46;
export const X_AXIS_HEIGHT = 40;

/** What is left for the plot itself. */
export function plotSize(width: number): { width: number; height: number } {
  return {
    width: Math.max(50, width - MARGIN.left - MARGIN.right - Y_AXIS_WIDTH),
    height: CHART_HEIGHT - MARGIN.top - MARGIN.bottom - X_AXIS_HEIGHT,
  };
}
