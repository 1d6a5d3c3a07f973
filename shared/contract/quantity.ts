import { z } from 'zod'

/** Units a person may type for an amount of something. */
export const VOLUME_UNITS = ['L', 'mL', 'galUS', 'flozUS', 'tbspUS', 'tspUS', 'cupUS', 'ptUS', 'qtUS', 'galImp', 'flozImp'] as const
export const MASS_UNITS = ['kg', 'g', 'lb', 'oz'] as const
/** Units of a rate over land, volume and mass. */
export const VOLUME_RATE_UNITS = ['L/ha', 'mL/ha', 'galUS/acre', 'flozUS/acre', 'ptUS/acre', 'galImp/acre'] as const
export const MASS_RATE_UNITS = ['kg/ha', 'lb/acre'] as const
export const SPEED_UNITS = ['kmh', 'mph', 'ms', 'knot'] as const
export const TEMPERATURE_UNITS = ['degC', 'degF'] as const

/** A decimal as typed: no sign, no exponent, no leading zero, at most 7 digits before the point and 4 after it. */
export const decimalText = z.string().regex(/^(0|[1-9]\d{0,6})(\.\d{1,4})?$/, { error: 'number.format', abort: true })

/** A decimal above zero. */
export const positiveDecimal = decimalText.refine((text) => /[1-9]/.test(text), { error: 'number.above_zero' })

/** A decimal that may be below zero, for temperatures. */
export const signedDecimal = z.string().regex(/^-?(0|[1-9]\d{0,2})(\.\d{1,4})?$/, { error: 'number.format' })

export const amountUnit = z.enum([...VOLUME_UNITS, ...MASS_UNITS], { error: 'unit.not_allowed' })
export const volumeUnit = z.enum(VOLUME_UNITS, { error: 'unit.not_allowed' })
export const rateUnit = z.enum([...VOLUME_RATE_UNITS, ...MASS_RATE_UNITS], { error: 'unit.not_allowed' })
export const volumeRateUnit = z.enum(VOLUME_RATE_UNITS, { error: 'unit.not_allowed' })

/** An amount above zero, as typed: the value keeps its digits, the unit its name. */
export const amountSchema = z.strictObject({ value: positiveDecimal, unit: amountUnit })

/** How an amount is known. */
export const knownSchema = z.enum(['measured', 'counted', 'workedOut'])

/** An amount with how it is known. */
export const knownAmountSchema = amountSchema.extend({ known: knownSchema })

export type Amount = z.infer<typeof amountSchema>
export type KnownAmount = z.infer<typeof knownAmountSchema>
export type AmountUnit = z.infer<typeof amountUnit>
export type RateUnit = z.infer<typeof rateUnit>
