import type { INestApplicationContext } from '@nestjs/common';
import type { DateTime } from 'luxon';
import { DataSource } from 'typeorm';
import type { Actor } from '../../access/actor.js';
import type { RichText } from '../../calc/vocabulary/discussions.js';
import { CaseSavingService } from '../../cases/case-saving.service.js';
import { CaseStageService } from '../../cases/case-stage.service.js';
import { CasesService } from '../../cases/cases.service.js';
import type { CaseChangesDto } from '../../cases/dto/case.dto.js';
import { Case } from '../../cases/entities/case.entity.js';
import { FinalDecisionsService } from '../../decisions/final-decisions.service.js';
import { DiscussionsService } from '../../discussions/discussions.service.js';
import { RemarksService } from '../../discussions/remarks.service.js';
import { ImagesService } from '../../images/images.service.js';
import { OutcomesService } from '../../outcomes/outcomes.service.js';
import { RatingsService } from '../../ratings/ratings.service.js';
import type { DemoCase, DemoRatings, DemoRemark } from './demo-case.js';
import type { DemoImage } from './demo-images.js';
import type { ConferenceKey } from './demo-people.js';
import type { DemoTime } from './demo-story.js';

const DAYS_BEFORE_MEETING = 12;

/** Writes, posts, discusses and rates the demo's cases, as their people. */
export class DemoCases {
  private readonly dataSource: DataSource;
  private readonly service = <T>(type: new (...args: never[]) => T): T => this.app.get(type as never, { strict: false });

  constructor(
    private readonly app: INestApplicationContext,
    private readonly images: DemoImage[],
    private readonly conferences: Record<ConferenceKey, string>,
    private readonly time: DemoTime,
    private readonly actor: (key: string) => Actor,
    private readonly at: (moment: DateTime) => void,
  ) {
    this.dataSource = app.get(DataSource);
  }

  /** Up to the first round; meetings go on from there. */
  async tell(demo: DemoCase): Promise<string> {
    const begin = this.time.meeting(demo.meetingWeek ?? 0).minus({ days: DAYS_BEFORE_MEETING, hours: this.hoursOf(demo) });
    const presenter = this.actor(demo.presenter);
    this.at(begin);
    const conferenceId = demo.content.heading.joint === 'knee' ? this.conferences.knee : this.conferences.hip;
    const { id, version } = await this.service(CasesService).create(presenter, { conferenceId });
    const changes = Object.fromEntries(Object.entries(demo.content).filter(([, section]) => Object.keys(section as object).length));
    const saved = await this.service(CaseSavingService).save(presenter, id, { baseVersion: version, changes: changes as CaseChangesDto });
    for (const image of this.images.filter((one) => demo.images.includes(one.caseKey))) {
      const file = { buffer: image.bytes, originalname: image.fileName } as Express.Multer.File;
      await this.service(ImagesService).upload(presenter, id, file, { projection: image.projection, interval: image.interval, caption: image.caption });
    }
    if (demo.until === 'draft') return id;
    this.at(begin.plus({ hours: 3 }));
    await this.service(CaseStageService).post(presenter, id, { baseVersion: saved.version });
    if (demo.until === 'checking') return id;
    const coordinator = this.actor('coordinator');
    this.at(begin.plus({ hours: 6 }));
    if (demo.until === 'returned') {
      await this.service(CaseStageService).return(coordinator, id, { remark: demo.returnRemark ?? '' });
      return id;
    }
    await this.service(CaseStageService).release(coordinator, id, { baseVersion: saved.version });
    await this.talk(id, demo.talk ?? [], begin.plus({ days: 1 }));
    await this.rate(id, 1, demo.first, begin.plus({ days: 2 }));
    if (demo.until === 'withdrawn') {
      this.at(begin.plus({ days: 4 }));
      await this.service(CaseStageService).withdraw(presenter, id, { reason: demo.withdrawnReason ?? '' });
    }
    return id;
  }

  /** What the treating surgeon says after the meeting. */
  async finish(demo: DemoCase, id: string): Promise<void> {
    if (demo.meetingWeek === undefined || !demo.final) return;
    const presenter = this.actor(demo.presenter);
    const meeting = this.time.meeting(demo.meetingWeek);
    this.at(meeting.plus({ days: 1 }));
    const planned = meeting.plus({ days: 16 });
    await this.service(FinalDecisionsService).write(presenter, id, {
      kind: demo.final.kind,
      reason: demo.final.reason ?? '',
      plannedWeek: `${planned.weekYear}-W${String(planned.weekNumber).padStart(2, '0')}`,
      patientInformed: demo.final.informed ?? null,
    });
    if (!demo.outcome) return;
    this.at(meeting.plus({ days: 20 }));
    const steps = (demo.content.plan.steps ?? []).map(({ id: stepId, method }) => ({ stepId, method, asPlanned: true }));
    await this.service(OutcomesService).write(presenter, id, { steps, boneLostHours: [], ...demo.outcome });
  }

  async rate(caseId: string, round: number, ratings: DemoRatings | undefined, from: DateTime): Promise<void> {
    const { content } = await this.dataSource.manager.findOneByOrFail(Case, { id: caseId });
    const options = content.options.options ?? [];
    for (const [index, [key, values]] of Object.entries(ratings ?? {}).entries()) {
      this.at(from.plus({ hours: index * 5 }));
      const best = values.indexOf(Math.max(...values));
      await this.service(RatingsService).give(this.actor(key), caseId, round, {
        ratings: options.map((option, position) => ({ optionId: option.id, value: values[position]! })),
        preferredOptionId: options[best]?.id ?? null,
        reason: '',
      });
    }
  }

  private async talk(caseId: string, remarks: DemoRemark[], from: DateTime): Promise<void> {
    for (const [index, remark] of remarks.entries()) {
      this.at(from.plus({ hours: index * 4 }));
      const [anchorKind, anchorRef] = remark.anchor ?? ['case', ''];
      const thread = await this.service(DiscussionsService).create(this.actor(remark.by), caseId, {
        anchorKind,
        anchorRef,
        kind: remark.kind ?? 'remark',
        content: richText(remark.text),
      });
      for (const [place, reply] of (remark.replies ?? []).entries()) {
        this.at(from.plus({ hours: index * 4 + place + 1 }));
        await this.service(RemarksService).reply(this.actor(reply.by), thread.id, { content: richText(reply.text), answers: reply.answers ?? false });
      }
    }
  }

  // cases of one meeting are not all posted in the same minute
  private hoursOf = (demo: DemoCase) => (demo.key.length * 7) % 30;
}

const richText = (text: string): RichText => ({ type: 'doc', content: [{ type: 'paragraph', content: [{ type: 'text', text }] }] });
