import type { InjectionKey } from 'vue'
import type { Figure, FigureContext, FigureFormat } from '~/charts/figure/figure'
import { saveFile } from '~/utils/saveFile'

const key: InjectionKey<() => FigureContext | null> = Symbol('figures')

/** What stands under the figures of this page; null where they may not be saved. */
export const provideFigures = (context: () => FigureContext | null) => provide(key, context)

/** PNG has twice the pixels of the figure: sharp at the size it is printed. */
const PNG_SCALE = 2

/** Saves charts of the page as figures, drawn in the browser. `context` is null where nobody offers them. */
export function useFigures() {
  const context = inject(key, () => null)
  const busy = ref(false)
  const problem = ref('')

  async function save(figure: Figure, format: FigureFormat, title: string, description: string) {
    const about = context()
    if (!about || busy.value) return
    busy.value = true
    problem.value = ''
    try {
      const [{ drawFigure }, { figureFileName }, { default: fontUrl }] = await Promise.all([
        import('~/charts/figure/drawFigure'),
        import('~/charts/figure/figure'),
        import('@fontsource-variable/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-wght-normal.woff2?inline'),
      ])
      const drawn = drawFigure(figure, { title, description, context: about, date: new Date(), fontUrl })
      const svg = new Blob([drawn.svg], { type: 'image/svg+xml' })
      saveFile(figureFileName(figure.name, about, format), format === 'svg' ? svg : await toPng(svg, drawn.width, drawn.height))
    }
    catch {
      problem.value = 'The figure could not be made. Try the other format, or fewer features.'
    }
    finally {
      busy.value = false
    }
  }
  return { offered: computed(() => context() !== null), busy, problem, save }
}

async function toPng(svg: Blob, width: number, height: number): Promise<Blob> {
  const url = URL.createObjectURL(svg)
  try {
    const image = new Image(width, height)
    image.src = url
    await image.decode()
    const canvas = document.createElement('canvas')
    canvas.width = width * PNG_SCALE
    canvas.height = height * PNG_SCALE
    canvas.getContext('2d')?.drawImage(image, 0, 0, canvas.width, canvas.height)
    const png = await new Promise<Blob | null>(resolve => canvas.toBlob(resolve, 'image/png'))
    if (!png) throw new Error('The canvas gave no picture.')
    return png
  }
  finally {
    URL.revokeObjectURL(url)
  }
}
