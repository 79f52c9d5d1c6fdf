import type { USES } from '@/shared/compute/factors/vocabulary'

type Use = (typeof USES)[number]

/** Words of registers and map tags in English, German, Dutch and French, the narrow ones before the wide. */
const words: readonly (readonly [Use, RegExp])[] = [
  [
    'ancillary',
    /garage|carport|shed|schuur|schuppen|nebengeb|bijgebouw|berging|annexe|outbuilding|greenhouse|gewächshaus/,
  ],
  ['terraced', /terrace|reihenhaus|rijtjes|rijwoning|mitoyen|row.?house/],
  [
    'multi-family',
    /apartment|multi.?family|mehrfamilien|wohnblock|flat(s|gebouw)?\b|appartement|meergezins|collecti(f|ve)|dormitory/,
  ],
  ['single-family', /detached|single.?family|einfamilien|vrijstaand|bungalow|villa|\bhouse\b|maison|individuel/],
  ['hotel', /hotel|hostel|logies|beherberg|hébergement/],
  ['office', /office|büro|buero|kantoor|bureau|verwaltung/],
  ['retail', /retail|shop|supermarket|winkel|laden|handel|einkauf|magasin|commerc/],
  [
    'public',
    /public|school|schule|kindergarten|hospital|krankenhaus|church|kirche|kerk|onderwijs|gezondheid|university|museum|civic|bijeenkomst|sport|öffentlich|enseignement|cel\b/,
  ],
  ['warehouse', /warehouse|lager|opslag|entrep[oô]t|magazijn|storage/],
  ['industrial', /industr|factory|fabri(k|que)|manufactur|werkstatt|workshop|usine|gewerbe/],
  ['agricultural', /agric|farm|barn|stable|stall|scheune|landwirtschaft|boerderij|agrarisch|grange/],
  ['multi-family', /residential|wohn(en|geb|haus|funktion)|woonfunctie|wonen|résidentiel|habitation|dwelling/],
  ['other', /^(other|sonstige.*|overige.*|autre.*)$/],
]

/** The use that the words of a register mean, or undefined when they mean none of ours. */
export function meantUse(text: string): Use | undefined {
  return words.find(([, pattern]) => pattern.test(text))?.[0]
}
