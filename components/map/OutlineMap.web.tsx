import type { Position } from 'geojson'
import { useCallback, useEffect, useId, useMemo, useRef, useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { unseen } from '@/components/ui/LiveRegion'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { useStillness } from '@/components/ui/theme/useStillness'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { RADIUS, SPACE } from '@/components/ui/theme/tokens'
import { areaFeatures } from './areaFeatures'
import { boundsOf, closedRing, type Bounds } from './boundsOf'
import { createOutlineCanvas, type OutlineCanvas } from './createOutlineCanvas'
import { DrawBar, MapButtons } from './MapControls'
import { outlineFeatures, streetFeatures } from './outlineFeatures'
import type { OutlineMapProps } from './OutlineMap.types'
import { prepareMapDocument } from './prepareMapDocument'

/**
 * Outlines on a map that needs no network: painted, hatched, pressed, and drawn around. Whatever it shows must also be
 * in a list beside it.
 */
export function OutlineMap(props: OutlineMapProps) {
  const { label, outlines, userPosition = null, overlay, heightPx } = props
  const { colours } = useTheme()
  const { t } = useMessages()
  const isStill = useStillness()
  const hintId = useId()
  const [draft, setDraft] = useState<readonly Position[] | null>(null)
  const bounds = useMemo(
    () => boundsToFit(props.outlines, props.areas, props.fitIds),
    [props.outlines, props.areas, props.fitIds],
  )

  const isDrawing = draft !== null
  const pressed = usePressed(props.onPress, isDrawing, setDraft)
  const { container, canvas, hasFailed } = useCanvas(bounds, pressed)
  useFeatures(canvas, props, draft)
  useFit(canvas, bounds, props.fitKey, !isStill)

  useEffect(() => {
    const drawn = canvas?.canvas()
    drawn?.setAttribute('aria-label', label)
    drawn?.setAttribute('aria-describedby', hintId)
  }, [canvas, label, hintId])

  const finish = (): void => {
    if (draft && draft.length > 2) props.onDraw?.({ type: 'Polygon', coordinates: [closedRing(draft)] })
    setDraft(null)
  }
  return (
    <View
      style={[
        styles.map,
        heightPx === undefined ? styles.fill : { height: heightPx },
        { backgroundColor: colours.sunken, borderColor: colours.hairline },
      ]}
    >
      <div
        ref={container}
        style={{ position: 'absolute', inset: 0 }}
        data-outlines={outlines.length}
        data-ready={canvas !== null}
      />
      <AppText id={hintId} style={unseen}>
        {t('common.map.keyboardHint')}
      </AppText>
      {hasFailed ? (
        <View style={styles.fault}>
          <Notice tone="attention" whatHappened={t('common.map.unavailable')} />
        </View>
      ) : null}
      {overlay && !isDrawing ? <View style={styles.overlay}>{overlay}</View> : null}
      {isDrawing ? <View style={[styles.cross, { borderColor: colours.action }]} /> : null}
      {canvas ? (
        <MapButtons
          onZoom={(steps) => canvas.zoomBy(steps)}
          onFit={bounds ? () => canvas.fit(bounds, !isStill) : undefined}
          onLocate={userPosition ? () => canvas.centreOn(userPosition) : undefined}
          onDraw={props.onDraw && !isDrawing ? () => setDraft([]) : undefined}
        />
      ) : null}
      {draft && canvas ? (
        <DrawBar
          cornerCount={draft.length}
          onCorner={() => setDraft([...draft, canvas.centre()])}
          onUndo={() => setDraft(draft.slice(0, -1))}
          onDone={finish}
          onCancel={() => setDraft(null)}
        />
      ) : null}
    </View>
  )
}

type SetDraft = (next: (draft: readonly Position[] | null) => readonly Position[] | null) => void

/** What a press means just now, behind a function that stays the same while the map lives. */
function usePressed(onPress: OutlineMapProps['onPress'], isDrawing: boolean, setDraft: SetDraft) {
  const now = useRef({ onPress, isDrawing })
  useEffect(() => {
    now.current = { onPress, isDrawing }
  })
  return useCallback(
    (id: string | null, place: Position): void => {
      if (now.current.isDrawing) setDraft((draft) => (draft ? [...draft, place] : draft))
      else if (id !== null) now.current.onPress?.(id)
    },
    [setDraft],
  )
}

/** Starts the map once its place and its theme are there, and ends it with them. */
function useCanvas(bounds: Bounds | null, onPress: (id: string | null, place: Position) => void) {
  const { colours } = useTheme()
  const container = useRef<HTMLDivElement>(null)
  const firstBounds = useRef(bounds)
  const [canvas, setCanvas] = useState<OutlineCanvas | null>(null)
  const [hasFailed, setHasFailed] = useState(false)
  useEffect(() => {
    firstBounds.current = bounds
  }, [bounds])

  useEffect(() => {
    if (!container.current) return undefined
    prepareMapDocument()
    const life = new AbortController()
    const fail = (): void => {
      if (!life.signal.aborted) setHasFailed(true)
    }
    createOutlineCanvas({
      container: container.current,
      colours,
      bounds: firstBounds.current,
      onPress,
      onFault: fail,
      signal: life.signal,
    }).then((made) => {
      if (!life.signal.aborted) setCanvas(made)
    }, fail)
    return () => {
      setCanvas(null)
      life.abort()
    }
  }, [colours, onPress])

  return { container, canvas, hasFailed }
}

function useFeatures(canvas: OutlineCanvas | null, props: OutlineMapProps, draft: readonly Position[] | null): void {
  const { outlines, paint, selectedIds, areas, streets, userPosition = null, followsUser = false } = props
  const { colours } = useTheme()
  useEffect(() => {
    canvas?.setFeatures('outlines', outlineFeatures(outlines, paint, colours.rule))
  }, [canvas, outlines, paint, colours])
  useEffect(() => {
    canvas?.setSelected(selectedIds ?? [])
  }, [canvas, selectedIds])
  useEffect(() => {
    canvas?.setFeatures('areas', areaFeatures(areas ?? [], colours.selection))
  }, [canvas, areas, colours])
  useEffect(() => {
    canvas?.setFeatures('streets', streetFeatures(streets ?? []))
  }, [canvas, streets])
  useEffect(() => {
    canvas?.setPosition(userPosition)
    if (followsUser && userPosition) canvas?.centreOn(userPosition)
  }, [canvas, userPosition, followsUser])
  useEffect(() => {
    canvas?.setDraft(draft ?? [])
  }, [canvas, draft])
}

/** Shows everything at first and when the key changes, not at every change of the outlines. */
function useFit(canvas: OutlineCanvas | null, bounds: Bounds | null, fitKey: string | undefined, moves: boolean): void {
  const fitted = useRef<{ canvas: OutlineCanvas; fitKey: string | undefined } | null>(null)
  useEffect(() => {
    if (!canvas || !bounds) return
    const last = fitted.current
    if (last?.canvas === canvas && last.fitKey === fitKey) return
    canvas.fit(bounds, moves && last?.canvas === canvas)
    fitted.current = { canvas, fitKey }
  }, [canvas, bounds, fitKey, moves])
}

function boundsToFit(
  outlines: OutlineMapProps['outlines'],
  areas: OutlineMapProps['areas'],
  fitIds: readonly string[] | undefined,
): Bounds | null {
  const wanted = fitIds ? new Set(fitIds) : null
  const chosen = wanted ? outlines.filter(({ id }) => wanted.has(id)) : [...outlines, ...(areas ?? [])]
  return boundsOf(chosen.map(({ geometry }) => geometry))
}

const styles = StyleSheet.create({
  map: { overflow: 'hidden', borderWidth: 1, borderRadius: RADIUS, width: '100%' },
  fill: { flex: 1, minHeight: 240 },
  overlay: { position: 'absolute', top: SPACE.medium, left: SPACE.medium, maxWidth: '78%', pointerEvents: 'box-none' },
  fault: { position: 'absolute', top: SPACE.medium, left: SPACE.medium, right: SPACE.medium },
  cross: {
    position: 'absolute',
    left: '50%',
    top: '50%',
    width: 14,
    height: 14,
    marginLeft: -7,
    marginTop: -7,
    borderWidth: 2,
    pointerEvents: 'none',
  },
})
