import type { INestApplicationContext } from '@nestjs/common';
import type { DateTime } from 'luxon';
import { DataSource } from 'typeorm';
import type { Actor } from '../../access/actor.js';
import { DecisionsService } from '../../decisions/decisions.service.js';
import { SigningService } from '../../decisions/signing.service.js';
import { AgendaService } from '../../meetings/agenda.service.js';
import { Meeting } from '../../meetings/entities/meeting.entity.js';
import { MeetingRunService } from '../../meetings/meeting-run.service.js';
import { RatingsService } from '../../ratings/ratings.service.js';
import { RoundsService } from '../../ratings/rounds.service.js';
import type { DemoCase } from './demo-case.js';
import type { DemoTime } from './demo-story.js';

const PRESENT = ['chair', 'panellist', 'panellist2', 'microbiology', 'radiology', 'anaesthesia', 'surgeon', 'surgeon2', 'coordinator', 'theatre'];
const AGENDA_DAYS_BEFORE = 3;

interface Told {
  demo: DemoCase;
  id: string;
}

/** Holds the demo's past meetings, and lists cases on the coming one. */
export class DemoMeetings {
  private readonly dataSource: DataSource;
  private readonly service = <T>(type: new (...args: never[]) => T): T => this.app.get(type as never, { strict: false });

  constructor(
    private readonly app: INestApplicationContext,
    private readonly conferenceId: string,
    private readonly time: DemoTime,
    private readonly actor: (key: string) => Actor,
    private readonly at: (moment: DateTime) => void,
    private readonly password: string,
  ) {
    this.dataSource = app.get(DataSource);
  }

  async hold(week: number, cases: Told[]): Promise<void> {
    const startsAt = this.time.meeting(week);
    const meeting = await this.make(startsAt);
    const coordinator = this.actor('coordinator');
    const listed = { baseVersion: meeting.version, items: cases.map(({ demo, id }) => ({ caseId: id, minutes: demo.minutes ?? 15 })) };
    this.at(startsAt.minus({ days: AGENDA_DAYS_BEFORE }));
    const agenda = await this.service(AgendaService).set(coordinator, meeting.id, listed);
    if (week >= 0) return;
    await this.service(AgendaService).send(coordinator, meeting.id, { baseVersion: agenda.version });
    this.at(startsAt);
    await this.service(MeetingRunService).start(this.actor('chair'), meeting.id);
    for (const key of PRESENT) await this.service(MeetingRunService).setAttendance(coordinator, meeting.id, this.actor(key).personId, key === 'microbiology' ? 'remote' : 'present');
    let clock = startsAt;
    for (const told of cases) {
      await this.decide(told, clock);
      clock = clock.plus({ minutes: told.demo.minutes ?? 15 });
    }
    this.at(clock);
    await this.service(MeetingRunService).close(this.actor('chair'), meeting.id);
  }

  private async decide({ demo, id }: Told, from: DateTime): Promise<void> {
    const chair = this.actor('chair');
    this.at(from.plus({ minutes: 4 }));
    await this.service(RoundsService).open(chair, id, 2);
    const options = demo.content.options.options ?? [];
    for (const [key, values] of Object.entries(demo.second ?? {})) {
      await this.service(RatingsService).give(this.actor(key), id, 2, {
        ratings: options.map((option, index) => ({ optionId: option.id, value: values[index]! })),
        preferredOptionId: options[values.indexOf(Math.max(...values))]?.id ?? null,
        reason: '',
      });
    }
    this.at(from.plus({ minutes: 8 }));
    await this.service(RoundsService).close(chair, id, 2);
    const { decision } = demo;
    if (!decision) return;
    const draft = await this.service(DecisionsService).write(chair, id, {
      chosenOptionId: decision.option,
      text: decision.text,
      conditions: decision.conditions,
      timing: decision.timing,
      dissent: (decision.dissent ?? []).map(({ by, words }) => ({ personId: this.actor(by).personId, words })),
    });
    await this.service(SigningService).sign(chair, id, { baseRevision: draft.revision, password: this.password });
  }

  /** A past meeting's row is put in as the job would have done it in its time. */
  private async make(startsAt: DateTime): Promise<Meeting> {
    const { manager } = this.dataSource;
    const at = startsAt.toJSDate();
    const id = (await manager.findOneBy(Meeting, { conferenceId: this.conferenceId, slotAt: at }))?.id;
    if (id) return manager.findOneByOrFail(Meeting, { id });
    return manager.save(
      manager.create(Meeting, {
        conferenceId: this.conferenceId,
        slotAt: at,
        ofSlot: true,
        startsAt: at,
        minutes: 60,
        agendaDueAt: startsAt.minus({ hours: 48 }).toJSDate(),
      }),
    );
  }
}
