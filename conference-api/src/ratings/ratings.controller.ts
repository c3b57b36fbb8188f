import { Body, Controller, Get, HttpCode, Param, Post, Put } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { CurrentActor } from '../common/decorators/current-actor.decorator.js';
import { RequirePermission } from '../common/decorators/route-access.decorator.js';
import { IdPipe, NumberPipe } from '../common/pipes/path-pipes.js';
import { GiveRatingDto, RatingDto } from './dto/rating.dto.js';
import { RatingsService } from './ratings.service.js';
import { RoundsService } from './rounds.service.js';

@ApiTags('ratings')
@Controller('cases/:caseId/rounds')
export class RatingsController {
  constructor(
    private readonly ratings: RatingsService,
    private readonly rounds: RoundsService,
  ) {}

  /** Both rounds; the panel's figures only once the own rating is in or the round is closed. */
  @Get()
  @RequirePermission(Permission.RatingRead)
  findOfCase(@CurrentActor() actor: Actor, @Param('caseId', IdPipe) caseId: string): Promise<RatingDto> {
    return this.ratings.findOfCase(actor, caseId);
  }

  /** Gives or changes the own rating; an earlier one stays on record. */
  @Put(':number/rating')
  @RequirePermission(Permission.Rate)
  give(
    @CurrentActor() actor: Actor,
    @Param('caseId', IdPipe) caseId: string,
    @Param('number', NumberPipe) number: number,
    @Body() body: GiveRatingDto,
  ): Promise<RatingDto> {
    return this.ratings.give(actor, caseId, number, body);
  }

  /** Opens the second round, at the meeting. */
  @Post(':number/open')
  @HttpCode(200)
  @RequirePermission(Permission.RoundControl)
  open(@CurrentActor() actor: Actor, @Param('caseId', IdPipe) caseId: string, @Param('number', NumberPipe) number: number): Promise<RatingDto> {
    return this.rounds.open(actor, caseId, number);
  }

  @Post(':number/close')
  @HttpCode(200)
  @RequirePermission(Permission.RoundControl)
  close(@CurrentActor() actor: Actor, @Param('caseId', IdPipe) caseId: string, @Param('number', NumberPipe) number: number): Promise<RatingDto> {
    return this.rounds.close(actor, caseId, number);
  }
}
