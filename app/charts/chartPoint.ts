/** A mark of a chart that was picked: which series, and the place of its value there. */
export interface ChartPoint { seriesId: string, dataIndex: number }

/** Where a value lies on the drawn chart, in CSS pixels; null where it is off the plot. `grid` picks the pair of axes. */
export type ToPixel = (value: [number, number], grid?: number) => [number, number] | null
