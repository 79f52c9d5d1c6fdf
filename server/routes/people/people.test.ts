import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Person } from '@/shared/schemas/person'
import { buildOrganisation } from '@/tests/support/buildOrganisation'
import { buildPerson } from '@/tests/support/buildPerson'
import { createTestApp, type TestApp } from '@/tests/support/createTestApp'
import { signInAs, type SignedInPerson } from '@/tests/support/signInAs'

let testApp: TestApp
let steward: SignedInPerson
let planner: SignedInPerson
let surveyor: SignedInPerson
let stranger: SignedInPerson
beforeAll(async () => {
  testApp = await createTestApp()
  const { organisationId } = await buildOrganisation(testApp)
  const member = async (role: 'steward' | 'planner' | 'surveyor', name: string) =>
    signInAs(testApp, await buildPerson(testApp, { organisationId, roles: [role], name }))
  steward = await member('steward', 'Ama Steward')
  planner = await member('planner', 'Cyr Planner')
  surveyor = await member('surveyor', 'Bea Surveyor')
  stranger = await signInAs(testApp, await buildPerson(testApp, { roles: ['steward'] }))
})
afterAll(() => testApp.close())

const list = (person: SignedInPerson, query = '') => testApp.http.get(`/api/v1/people${query}`).set(person.bearer)
const invite = (person: SignedInPerson, body: object) =>
  testApp.http.post('/api/v1/people/invitations').set(person.bearer).send(body)
const change = (person: SignedInPerson, personId: string, body: object) =>
  testApp.http.patch(`/api/v1/people/${personId}`).set(person.bearer).send(body)
const namesOf = (people: Person[]) => people.map(({ name }) => name)

describe('the list of people', () => {
  it('shows the own organisation by name, and by role', async () => {
    expect(namesOf((await list(planner)).body.people)).toEqual(['Ama Steward', 'Bea Surveyor', 'Cyr Planner'])
    expect(namesOf((await list(steward, '?role=surveyor')).body.people)).toEqual(['Bea Surveyor'])
    expect((await list(stranger)).body.people).toHaveLength(1)
  })

  it('is for stewards and planners, with roles that exist', async () => {
    expect((await list(surveyor)).status).toBe(403)
    expect((await testApp.http.get('/api/v1/people')).status).toBe(401)
    expect((await list(steward, '?role=king')).status).toBe(422)
  })

  it('carries no password digest', async () => {
    expect(JSON.stringify((await list(steward)).body)).not.toMatch(/argon|password/i)
  })
})

describe('inviting', () => {
  it('adds an invited person and mails a link', async () => {
    const email = `invited-${randomUUID()}@ferrow.invalid`
    const answer = await invite(steward, {
      email,
      name: 'Dov Neumann',
      roles: ['contractor'],
      firm: 'Neumann Clearing',
    })

    expect(answer.status).toBe(201)
    expect(answer.body).toMatchObject({
      name: 'Dov Neumann',
      email,
      status: 'invited',
      firm: 'Neumann Clearing',
      lastSeenAt: null,
    })
    expect(testApp.context.mailer.lastTo(email).text).toContain('/join/')
  })

  it('sends a new link and corrects the roles when the address has not joined yet', async () => {
    const email = `again-${randomUUID()}@ferrow.invalid`
    const first = await invite(steward, { email, name: 'Eli', roles: ['surveyor'] })
    const firstToken = testApp.context.mailer.tokenTo(email)
    const second = await invite(steward, { email, name: 'Eli Roth', roles: ['planner', 'planner'] })

    expect(second.body).toMatchObject({ personId: first.body.personId, name: 'Eli Roth', roles: ['planner'] })
    expect((await testApp.http.get(`/api/v1/auth/invitations/${firstToken}`)).status).toBe(404)
  })

  it('refuses an address that has an account, here or elsewhere', async () => {
    for (const { email } of [planner, stranger]) {
      const answer = await invite(steward, { email, name: 'Twice', roles: ['planner'] })
      expect([answer.status, answer.body.code]).toEqual([409, 'address-taken'])
    }
  })

  it('names bad input, and is for stewards only', async () => {
    const bad = await invite(steward, { email: 'nowhere', name: '', roles: [] })

    expect(bad.body.faults.map(({ pointer }: { pointer: string }) => pointer)).toEqual([
      '/body/email',
      '/body/name',
      '/body/roles',
    ])
    expect((await invite(planner, { email: 'x@ferrow.invalid', name: 'X', roles: ['planner'] })).status).toBe(403)
  })
})

describe('changing a person', () => {
  it('changes roles and keeps a trail', async () => {
    const person = await buildPerson(testApp, { organisationId: steward.organisationId })
    const answer = await change(steward, person.personId, { roles: ['surveyor', 'planner'] })

    expect(answer.body).toMatchObject({ roles: ['surveyor', 'planner'], status: 'active' })
    const [trail] = await testApp.owner.rows('SELECT person_id, detail FROM audit_entry WHERE subject_id = $id', {
      id: person.personId,
    })
    expect(trail).toEqual({
      person_id: steward.personId,
      detail: {
        from: { roles: ['surveyor'], status: 'active' },
        to: { roles: ['surveyor', 'planner'], status: 'active' },
      },
    })
  })

  it('ends every session of a person it disables, at once', async () => {
    const person = await signInAs(testApp, await buildPerson(testApp, { organisationId: steward.organisationId }))
    await change(steward, person.personId, { status: 'disabled' })
    expect((await testApp.http.get('/api/v1/account').set(person.bearer)).status).toBe(403)

    await change(steward, person.personId, { status: 'active' })
    expect((await testApp.http.get('/api/v1/account').set(person.bearer)).status).toBe(401)
  })

  it('keeps the last steward, even when two shut each other out at the same time', async () => {
    const { organisationId } = await buildOrganisation(testApp)
    const pair = await Promise.all(
      [0, 1].map(async () => signInAs(testApp, await buildPerson(testApp, { organisationId, roles: ['steward'] }))),
    )
    const [one, other] = pair as [SignedInPerson, SignedInPerson]

    const answers = await Promise.all([
      change(one, other.personId, { status: 'disabled' }),
      change(other, one.personId, { roles: ['planner'] }),
    ])

    // who comes second is told so, or is no steward any more when asking; never are both let through
    const [refused, ...others] = answers.filter(({ status }) => status !== 200)
    expect(others).toEqual([])
    expect(['last-steward', 'account-disabled', 'forbidden']).toContain(refused?.body.code)
    const [{ stewards } = { stewards: 0 }] = await testApp.owner.rows<{ stewards: number }>(
      `SELECT count(*)::integer AS stewards FROM person
       WHERE organisation_id = $organisationId AND status = 'active' AND 'steward' = ANY(roles)`,
      { organisationId },
    )
    expect(stewards).toBe(1)
  })

  it('does not make an invited person active', async () => {
    const person = await buildPerson(testApp, { organisationId: steward.organisationId, status: 'invited' })

    expect((await change(steward, person.personId, { status: 'active' })).body.code).toBe('not-joined-yet')
    await change(steward, person.personId, { status: 'disabled' })
    expect((await change(steward, person.personId, { status: 'active' })).body.status).toBe('invited')
  })

  it('knows nobody of another organisation', async () => {
    for (const personId of [stranger.personId, randomUUID()]) {
      expect((await change(steward, personId, { roles: ['planner'] })).status).toBe(404)
    }
    expect((await change(planner, surveyor.personId, { roles: ['planner'] })).status).toBe(403)
    expect((await change(steward, 'me', { roles: ['king'] })).body.faults).toHaveLength(2)
  })
})
