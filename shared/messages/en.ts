import audit from './en/audit.json'
import auth from './en/auth.json'
import bag from './en/bag.json'
import calibrate from './en/calibrate.json'
import cautions from './en/cautions.json'
import common from './en/common.json'
import devices from './en/devices.json'
import comparison from './en/comparison.json'
import district from './en/district.json'
import errors from './en/errors.json'
import factorBook from './en/factorBook.json'
import listed from './en/listed.json'
import loads from './en/loads.json'
import mail from './en/mail.json'
import me from './en/me.json'
import nav from './en/nav.json'
import nextLook from './en/nextLook.json'
import notices from './en/notices.json'
import outlines from './en/outlines.json'
import people from './en/people.json'
import publish from './en/publish.json'
import receipts from './en/receipts.json'
import review from './en/review.json'
import rounds from './en/rounds.json'
import runs from './en/runs.json'
import sheet from './en/sheet.json'
import stock from './en/stock.json'
import street from './en/street.json'
import today from './en/today.json'
import vocabulary from './en/vocabulary.json'
import yearsAhead from './en/yearsAhead.json'

/** The English catalogue, one section a screen. Its shape is the type of every message key. */
export const en = {
  audit,
  auth,
  bag,
  calibrate,
  cautions,
  common,
  comparison,
  devices,
  district,
  errors,
  factorBook,
  listed,
  loads,
  mail,
  me,
  nav,
  nextLook,
  notices,
  outlines,
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
