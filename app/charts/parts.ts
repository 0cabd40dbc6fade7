import { BarChart, LineChart, ScatterChart } from 'echarts/charts'
import { AriaComponent, DataZoomComponent, GridComponent, LegendComponent, MarkAreaComponent, MarkLineComponent, TooltipComponent } from 'echarts/components'
import { use } from 'echarts/core'
import { CanvasRenderer } from 'echarts/renderers'

/** Only what our charts draw with; loaded in the browser with the first chart. */
export function useChartParts() {
  use([
    BarChart, LineChart, ScatterChart, CanvasRenderer,
    AriaComponent, DataZoomComponent, GridComponent, LegendComponent, MarkAreaComponent, MarkLineComponent, TooltipComponent,
  ])
}
