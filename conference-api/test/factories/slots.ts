import { Conference } from '../../src/conferences/entities/conference.entity.js';
import type { Case } from '../../src/cases/entities/case.entity.js';
import type { TestApp } from '../support/test-app.js';
import { makeCase } from './case-rows.js';
import { addImageRow, readyContent } from './cases.js';
import type { World, WorldPerson } from './world.js';

const DAY = 86_400_000;

/** An open case with nothing missing. */
export async function makeListable(test: TestApp, world: World, presenter: WorldPerson = 'surgeon', conferenceId?: string): Promise<Case> {
  const found = await makeCase(test, world, { presenter, content: readyContent(), ...(conferenceId ? { conferenceId } : {}) });
  await addImageRow(test, found.id, world.people[presenter].id, 'ap-pelvis');
  await addImageRow(test, found.id, world.people[presenter].id, 'lateral');
  return found;
}

/** Puts a meeting outside the slot in, over HTTP. */
export async function createMeeting(test: TestApp, world: World, daysAhead = 5, minutes = 60) {
  const startsAt = new Date(Math.ceil(Date.now() / 60_000) * 60_000 + daysAhead * DAY).toISOString();
  const response = await test.http().post(`/api/conferences/${world.conferenceId}/meetings`).set(world.people.chair.auth).send({ startsAt, minutes });
  if (response.status !== 201) throw new Error(`creating a meeting answered ${response.status}: ${response.text}`);
  return response.body as { id: string; version: number; startsAt: string; minutes: number; agendaDueAt: string };
}

export const setSlot = (test: TestApp, conferenceId: string, slot: Partial<Pick<Conference, 'timeZone' | 'slotStart' | 'slotRule' | 'slotMinutes' | 'agendaHoursBefore'>>) =>
  test.dataSource.manager.update(Conference, { id: conferenceId }, slot);
