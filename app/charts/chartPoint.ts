/** A mark of a chart that was picked: which series, and the place of its value there. */
export interface ChartPoint { seriesId: string, dataIndex: number }

/** Where a value of the first pair of axes lies on the drawn chart, in CSS pixels; null where it is off the plot. */
export type ToPixel = (value: [number, number]) => [number, number] | null
