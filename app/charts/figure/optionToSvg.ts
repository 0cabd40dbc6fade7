import type { EChartsOption } from 'echarts'
import { init, use } from 'echarts/core'
import { SVGRenderer } from 'echarts/renderers'
import { allowedXml } from '~/charts/figure/escapeXml'
import { fonts } from '#shared/tokens'
import { useChartParts } from '~/charts/parts'

/** Draws an option as SVG text, without a page: the same option that the page shows. */
export function optionToSvg(option: EChartsOption, width: number, height: number): string {
  useChartParts()
  use([SVGRenderer])
  const chart = init(null, null, { renderer: 'svg', ssr: true, width, height })
  try {
    chart.setOption({ ...option, animation: false, tooltip: { show: false } })
    // It writes the names of fonts into an attribute as they are; their quotes would end it.
    return [fonts.text, fonts.numbers].reduce((svg, font) => svg.replaceAll(font, font.replaceAll('"', '\'')), allowedXml(chart.renderToSVGString()))
  }
  finally {
    chart.dispose()
  }
}
