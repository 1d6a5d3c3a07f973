import { computed, watch, type ComputedRef } from 'vue'
import { useI18n } from 'vue-i18n'
import type { GroundKind, SiteKind } from '../../../shared/contract/ground.ts'
import { lineLengthM } from '../../../shared/geo/lineLengthM.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import type { Language } from '../../../shared/messages/translate.ts'
import { parseQuantityText } from '../../../shared/units/parseQuantityText.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { areaWords, lengthWords } from './blockWords.ts'
import type { MapGround } from '../map/mapGround.ts'
import type { MapDraft } from '../map/mapTypes.ts'
import { crossingEdges, outlineWords } from './outlineWords.ts'
import { useGroundDraft, type GroundContent } from './useGroundDraft.ts'
import { useGroundForm, type GroundForm, type GroundSubject } from './useGroundForm.ts'
import type { KeptForm } from '../form/useKeptForm.ts'
import { usePlaceDrawing, type PlaceDrawing, type PlaceShape } from './usePlaceDrawing.ts'
import { useRings, type Kept } from './useRings.ts'

/** A site or a piece of the ground plan in the making: where it is, what it is, and how the map shows it meanwhile. */
export interface GroundEditor {
  drawing: PlaceDrawing
  form: GroundForm
  kept: KeptForm<GroundContent>
  /** Ways it may be drawn. */
  shapes: ComputedRef<readonly PlaceShape[]>
  mapDraft: ComputedRef<MapDraft>
  preview: ComputedRef<{ ground: MapGround; insteadOf: string | null }>
  /** "3 points, 112 m". */
  summary: ComputedRef<string>
  /** What is wrong with the drawing, in words. */
  fault: ComputedRef<string>
}

/** How most of a kind are drawn; taken while nothing is drawn yet. */
const USUAL: Partial<Record<SiteKind | GroundKind, PlaceShape>> = { watercourse: 'line', pond: 'area', neighbourCrop: 'area', building: 'area', track: 'line', hedge: 'line', well: 'point', hives: 'point' }

export function useGroundEditor(subject: GroundSubject, language: () => Language): GroundEditor {
  const { t } = useI18n()
  const preferences = usePreferences()
  const isSite = subject.what === 'site'
  const drawing = usePlaceDrawing({ geometry: subject.was?.geometry ?? null, shape: isSite ? 'point' : 'line' }, language)
  const form = useGroundForm(subject, drawing)
  const kept = useGroundDraft(subject, form, drawing)
  const { shape, points, geometry, by, cross, findings } = drawing
  const metres = computed(() => {
    const read = parseQuantityText(form.draft.metres)
    return read.ok && Number(read.value) > 0 && Number(read.value) <= 5_000 ? Number(read.value) : null
  })
  const keptClear = computed<readonly Kept[]>(() => (isSite && geometry.value !== null ? [{ geometry: geometry.value, keepClearM: metres.value }] : []))
  const rings = useRings(() => keptClear.value)

  watch(() => form.draft.kind, (kind) => {
    const usual = kind === null ? undefined : USUAL[kind]
    if (usual !== undefined && points.value.length === 0) drawing.setShape(usual)
  })

  const summary = computed(() => {
    const count = points.value.length
    if (count === 0 || (geometry.value === null && shape.value === 'point')) return t('ground.form.none')
    if (geometry.value?.type === 'Point') return t('ground.form.pointAt')
    const length = lengthWords(preferences.reader, geometry.value?.type === 'LineString' ? lineLengthM(geometry.value.coordinates) : 0)
    const area = areaWords(preferences.reader, geometry.value?.type === 'Polygon' ? measurePolygon(geometry.value).areaM2 : 0)
    return t(shape.value === 'line' ? 'ground.form.lineOf' : 'ground.form.areaOf', { points: count, length, area }, count === 1 ? 1 : 2)
  })

  return {
    drawing, form, kept, summary,
    shapes: computed(() => (isSite || form.draft.kind === 'other' ? ['point', 'line', 'area'] : form.draft.kind === 'building' ? ['area'] : ['line', 'area'])),
    fault: computed(() => {
      const [finding] = findings.value
      return finding === undefined ? (form.errors.value['geometry'] ?? '') : outlineWords(language(), finding)
    }),
    mapDraft: computed(() => ({
      points: points.value, closed: by.value === 'points', isOpen: shape.value !== 'area', crossingEdges: crossingEdges(findings.value), cross: by.value === 'draw' ? cross.value : null,
    })),
    preview: computed(() => ({ insteadOf: subject.was?.id ?? null, ground: previewOf() })),
  }

  function previewOf(): MapGround {
    const { kind, name } = form.draft
    if (geometry.value === null) return { features: [], sites: [] }
    const common = { id: 'preview', geometry: geometry.value }
    if (isSite) return { features: [], sites: [{ ...common, kind: (kind ?? 'other') as SiteKind, name, ring: rings.value[0] ?? null }] }
    return { sites: [], features: [{ ...common, kind: (kind ?? 'other') as GroundKind, name: name.trim() === '' ? null : name, widthM: metres.value }] }
  }
}
