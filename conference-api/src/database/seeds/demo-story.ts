import type { INestApplicationContext } from '@nestjs/common';
import { DateTime } from 'luxon';
import { DataSource, In } from 'typeorm';
import type { Actor } from '../../access/actor.js';
import { PasswordHasher } from '../../auth/password-hasher.js';
import { Conference } from '../../conferences/entities/conference.entity.js';
import { Membership } from '../../conferences/entities/membership.entity.js';
import { LiveEvent } from '../../events/entities/live-event.entity.js';
import { OutboxMail } from '../../mail/entities/outbox-mail.entity.js';
import { Person } from '../../people/entities/person.entity.js';
import { Unit } from '../../people/entities/unit.entity.js';
import { UnitOfWork } from '../unit-of-work.js';
import { BONE_CASES } from './demo-cases/bone-loss.js';
import { INFECTION_CASES } from './demo-cases/infections.js';
import { POSITION_CASES } from './demo-cases/positions.js';
import { STEM_AND_KNEE_CASES } from './demo-cases/stems-and-knees.js';
import type { DemoImage } from './demo-images.js';
import { DemoMeetings } from './demo-meetings.js';
import { type ConferenceKey, PEOPLE, UNITS } from './demo-people.js';
import { DemoCases } from './demo-case-story.js';

const TIME_ZONE = 'Europe/London';
const CASES = [...POSITION_CASES, ...INFECTION_CASES, ...BONE_CASES, ...STEM_AND_KNEE_CASES];

/** Where the demo's past and future lie. */
export interface DemoTime {
  /** The coming meeting on which cases are listed; meetings are a week apart. */
  nextMeeting: DateTime;
  meeting: (weeksFromNext: number) => DateTime;
}

/** Tells the demo through the application's own use cases, as its people, at times in the past. */
export class DemoStory {
  private readonly work: UnitOfWork;
  private readonly dataSource: DataSource;
  private readonly actors = new Map<string, Actor>();

  constructor(
    private readonly app: INestApplicationContext,
    private readonly images: DemoImage[],
    private readonly password: string,
  ) {
    this.work = app.get(UnitOfWork, { strict: false });
    this.dataSource = app.get(DataSource);
  }

  async tell(): Promise<{ people: number; cases: number }> {
    const time = demoTime();
    const conferences = await this.makePeople(time);
    const actor = (key: string): Actor => this.actors.get(key)!;
    const at = (moment: DateTime) => {
      this.work.clock = () => moment.toJSDate();
    };
    const meetings = new DemoMeetings(this.app, conferences.hip, time, actor, at, this.password);
    const cases = new DemoCases(this.app, this.images, conferences, time, actor, at);
    const told = [];
    for (const demo of CASES) told.push({ demo, id: await cases.tell(demo) });
    for (const week of [-5, -1, 0]) await meetings.hold(week, told.filter(({ demo }) => demo.meetingWeek === week));
    for (const { demo, id } of told) await cases.finish(demo, id);
    this.work.clock = () => new Date();
    await this.quieten();
    return { people: PEOPLE.length, cases: CASES.length };
  }

  private async makePeople(time: DemoTime): Promise<Record<ConferenceKey, string>> {
    const { manager } = this.dataSource;
    const unitIds = new Map<string, string>();
    for (const [key, unit] of Object.entries(UNITS)) unitIds.set(key, (await manager.save(manager.create(Unit, unit))).id);
    const slotStart = time.meeting(-10).toFormat("yyyy-MM-dd'T'HH:mm");
    const common = { timeZone: TIME_ZONE, slotStart, slotRule: 'FREQ=WEEKLY', slotMinutes: 60, agendaHoursBefore: 48 };
    const hip = await manager.save(
      manager.create(Conference, {
        ...common,
        name: 'Hip revision',
        code: 'HIP',
        quorumRule: { raters: 5, disciplines: [{ discipline: 'revision-surgery', atLeast: 2 }, { discipline: 'infection-microbiology', atLeast: 1, infectionOnly: true }] },
      }),
    );
    const knee = await manager.save(manager.create(Conference, { ...common, name: 'Knee revision', code: 'KNEE', quorumRule: { raters: 3, disciplines: [] } }));
    const conferences = { hip: hip.id, knee: knee.id };
    const passwordHash = await this.app.get(PasswordHasher, { strict: false }).hash(this.password);
    for (const person of PEOPLE) {
      const { id } = await manager.save(
        manager.create(Person, {
          email: `${person.key}@kerfside.example`,
          name: person.name,
          discipline: person.discipline,
          unitId: unitIds.get(person.unit)!,
          passwordHash,
          isAdministrator: person.isAdministrator ?? false,
        }),
      );
      const roles = Object.entries(person.roles).map(([key, role]) => [conferences[key as ConferenceKey], role] as const);
      for (const [conferenceId, role] of roles) await manager.insert(Membership, { conferenceId, personId: id, role });
      this.actors.set(person.key, { personId: id, sessionId: '', name: person.name, isAdministrator: person.isAdministrator ?? false, roles: new Map(roles), address: '' });
    }
    return conferences;
  }

  /** The past is not mailed again, nor told to open pages. */
  private async quieten(): Promise<void> {
    await this.dataSource.manager.update(OutboxMail, { state: In(['queued']) }, { state: 'dropped', lastError: 'Demo: told before the installation was set up' });
    await this.dataSource.manager.createQueryBuilder().delete().from(LiveEvent).execute();
  }
}

/** The next meeting is on a working day three to five days ahead, at half past seven in the morning. */
function demoTime(): DemoTime {
  const today = DateTime.now().setZone(TIME_ZONE).startOf('day').set({ hour: 7, minute: 30 });
  const nextMeeting = [4, 3, 5].map((days) => today.plus({ days })).find((day) => day.weekday <= 5)!;
  return { nextMeeting, meeting: (weeks) => nextMeeting.plus({ weeks }) };
}
