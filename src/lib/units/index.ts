// Sizes as the trade types and says them: inch fractions, millimetres, displacement.
// Not for deciding which sizes fit each other, and not for money or dates.
// Imports nothing but itself; holds lengths in mm and displacement in cc.
export { inchToMm, mmToInch, parseLength, type LengthReading, type LengthUnit } from './length';
export { bothWays, inInches, inMm } from './say-length';
export {
	ccToCubicInch,
	cubicInchToCc,
	parseDisplacement,
	type DisplacementReading
} from './displacement';
