import auth from './de/auth.json'
import bag from './de/bag.json'
import cautions from './de/cautions.json'
import common from './de/common.json'
import comparison from './de/comparison.json'
import district from './de/district.json'
import factorBook from './de/factorBook.json'
import listed from './de/listed.json'
import loads from './de/loads.json'
import mail from './de/mail.json'
import me from './de/me.json'
import nav from './de/nav.json'
import nextLook from './de/nextLook.json'
import people from './de/people.json'
import publish from './de/publish.json'
import receipts from './de/receipts.json'
import review from './de/review.json'
import rounds from './de/rounds.json'
import runs from './de/runs.json'
import sheet from './de/sheet.json'
import stock from './de/stock.json'
import street from './de/street.json'
import today from './de/today.json'
import vocabulary from './de/vocabulary.json'
import yearsAhead from './de/yearsAhead.json'

/** The German catalogue, in the nesting of the English one. */
export const de = {
  auth,
  bag,
  cautions,
  common,
  comparison,
  district,
  factorBook,
  listed,
  loads,
  mail,
  me,
  nav,
  nextLook,
  people,
  publish,
  receipts,
  review,
  rounds,
  runs,
  sheet,
  stock,
  street,
  today,
  vocabulary,
  yearsAhead,
}
