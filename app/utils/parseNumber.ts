export { parseNumber } from '#shared/formats/typedNumber'
