import { Body, Controller, Delete, Get, HttpCode, Param, Patch, Post, Put } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { CurrentActor } from '../common/decorators/current-actor.decorator.js';
import { RequirePermission, SignedIn } from '../common/decorators/route-access.decorator.js';
import { IdPipe } from '../common/pipes/path-pipes.js';
import { DiscussionsService } from './discussions.service.js';
import {
  AnswerThreadDto,
  CreateRemarkDto,
  CreateThreadDto,
  RemarkDto,
  RemarkVersionListDto,
  ThreadDto,
  ThreadListDto,
  UnreadListDto,
  UpdateRemarkDto,
} from './dto/discussion.dto.js';
import { ReadingService } from './reading.service.js';
import { RemarksService } from './remarks.service.js';

@ApiTags('discussions')
@Controller()
export class DiscussionsController {
  constructor(
    private readonly discussions: DiscussionsService,
    private readonly remarks: RemarksService,
    private readonly reading: ReadingService,
  ) {}

  @Get('cases/:caseId/threads')
  @RequirePermission(Permission.CaseRead)
  findOfCase(@CurrentActor() actor: Actor, @Param('caseId', IdPipe) caseId: string): Promise<ThreadListDto> {
    return this.discussions.findOfCase(actor, caseId);
  }

  @Post('cases/:caseId/threads')
  @RequirePermission(Permission.RemarkWrite)
  create(@CurrentActor() actor: Actor, @Param('caseId', IdPipe) caseId: string, @Body() body: CreateThreadDto): Promise<ThreadDto> {
    return this.discussions.create(actor, caseId, body);
  }

  @Post('threads/:id/remarks')
  @RequirePermission(Permission.RemarkWrite)
  reply(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: CreateRemarkDto): Promise<RemarkDto> {
    return this.remarks.reply(actor, id, body);
  }

  /** The presenter, or who asked, says that a question is answered, or opens it again. */
  @Put('threads/:id/answered')
  @RequirePermission(Permission.RemarkWrite)
  answered(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: AnswerThreadDto): Promise<ThreadDto> {
    return this.discussions.setAnswered(actor, id, body.answered);
  }

  @Patch('remarks/:id')
  @RequirePermission(Permission.RemarkWrite)
  edit(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: UpdateRemarkDto): Promise<RemarkDto> {
    return this.remarks.edit(actor, id, body);
  }

  /** Leaves a mark that something was said here. */
  @Delete('remarks/:id')
  @HttpCode(204)
  @RequirePermission(Permission.RemarkWrite)
  remove(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<void> {
    return this.remarks.remove(actor, id);
  }

  @Get('remarks/:id/versions')
  @RequirePermission(Permission.CaseRead)
  versions(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<RemarkVersionListDto> {
    return this.remarks.versions(actor, id);
  }

  /** All remarks of the case are read up to now. */
  @Put('cases/:caseId/read')
  @HttpCode(204)
  @RequirePermission(Permission.CaseRead)
  read(@CurrentActor() actor: Actor, @Param('caseId', IdPipe) caseId: string): Promise<void> {
    return this.reading.markRead(actor, caseId);
  }

  /** Unread remarks by case. */
  @Get('unread')
  @SignedIn()
  unread(@CurrentActor() actor: Actor): Promise<UnreadListDto> {
    return this.reading.unread(actor);
  }
}
