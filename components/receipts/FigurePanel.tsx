import { View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { sum } from '@/shared/compute/sum'
import { formatArea, formatDecimal, formatMass, formatMassRange } from '@/shared/format'
import type { Receipt } from '@/shared/schemas/receipt'
import { componentName, figureName, groupName } from './receiptNames'

/** Groups written out in the formula; the others follow as one. */
const WRITTEN_OUT = 4

/** The figure, its band, and the formula with its numbers. */
export function FigurePanel({ receipt }: { readonly receipt: Receipt }) {
  const messages = useMessages()
  const { t, locale } = messages
  const { figure, run, massKg, band, groups, buildings } = receipt
  const building = figure.buildingId === null ? undefined : buildings[0]?.label
  const terms = groups.reduce((count, group) => count + group.terms.length, 0)
  const left = Math.abs(massKg - sum(groups.map((group) => group.massKg)))
  return (
    <Panel
      title={
        building
          ? t('receipts.ofGroup', { figure: figureName(figure, messages), group: building })
          : figureName(figure, messages)
      }
      tone="selection"
    >
      <AppText kind="figure" size="figure">
        {formatMass(massKg, locale)}
      </AppText>
      <AppText soft>
        {band ? t('receipts.band', { range: formatMassRange(band.p10Kg, band.p90Kg, locale) }) : t('receipts.noBand')}
      </AppText>
      <AppText kind="heading" level={3}>
        {t('receipts.formula')}
      </AppText>
      <AppText>{t(FORMULAS[figure.kind], { groups: groups.length, terms })}</AppText>
      <View>
        <Formula receipt={receipt} />
      </View>
      <AppText soft>{t('receipts.addsUp', { share: `${formatDecimal(left, locale, 6)} kg` })}</AppText>
      <AppText soft>
        {t('receipts.conventions', {
          offset: formatDecimal(run.scenario.yearOffset, locale, 1),
          year: String(run.surveyYear),
          engine: run.engineVersion,
        })}
      </AppText>
      {figure.kind === 'stock' ? null : <AppText soft>{t('receipts.probabilistic')}</AppText>}
    </Panel>
  )
}

const FORMULAS = {
  stock: 'receipts.formulaStock',
  demolition: 'receipts.formulaDemolition',
  refurbishment: 'receipts.formulaRefurbishment',
} as const

function Formula({ receipt: { groups, massKg } }: { readonly receipt: Receipt }) {
  const { t, locale } = useMessages()
  const [only] = groups
  const mass = (kg: number): string => formatMass(kg, locale)
  if (groups.length === 1 && only) {
    const further = only.terms.slice(WRITTEN_OUT * 2)
    return (
      <>
        {only.terms
          .slice(0, WRITTEN_OUT * 2)
          .map(({ material, component, countedAreaM2, contentKgPerM2, massKg: termKg }) => (
            <AppText key={`${material}/${component}`} kind="number">
              {`${t(`vocabulary.material.${material}`)}, ${componentName(component, t)}: ${t('receipts.formulaLine', {
                area: formatArea(countedAreaM2, locale),
                content: formatDecimal(contentKgPerM2, locale, 2),
                mass: mass(termKg),
              })}`}
            </AppText>
          ))}
        {further.length > 0 ? (
          <AppText kind="number">
            {t('receipts.formulaRestLines', {
              mass: mass(sum(further.map((term) => term.massKg))),
              count: further.length,
            })}
          </AppText>
        ) : null}
        <Total text={`= ${mass(massKg)}`} />
      </>
    )
  }
  const rest = groups.slice(WRITTEN_OUT)
  const restKg = sum(rest.map((group) => group.massKg))
  return (
    <>
      {groups.slice(0, WRITTEN_OUT).map((group) => (
        <AppText key={groupName(group, t)} kind="number">
          {`${mass(group.massKg)}  ${groupName(group, t)}`}
        </AppText>
      ))}
      {rest.length > 0 ? (
        <AppText kind="number">{t('receipts.formulaRest', { mass: mass(restKg), count: rest.length })}</AppText>
      ) : null}
      <Total text={`= ${mass(massKg)}`} />
    </>
  )
}

function Total({ text }: { readonly text: string }) {
  return (
    <AppText kind="number" weight="semibold">
      {text}
    </AppText>
  )
}
