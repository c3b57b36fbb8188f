import { ApiProperty } from '@nestjs/swagger';
import { IsOptional, Matches } from 'class-validator';
import { PersonRefDto } from '../../common/people/person-ref.dto.js';
import { OptionalText, RequiredInteger, RequiredList } from '../../common/validation/fields.js';

export class OptionRatingDto {
  @Matches(/^[A-Za-z0-9_-]{1,40}$/)
  optionId: string;

  @RequiredInteger(1, 9)
  value: number;
}

export class GiveRatingDto {
  /** One for each option of the round. */
  @RequiredList(() => OptionRatingDto, 6)
  ratings: OptionRatingDto[];

  @IsOptional()
  @Matches(/^[A-Za-z0-9_-]{1,40}$/)
  preferredOptionId?: string | null;

  @OptionalText(4000)
  reason?: string;
}

export class BallotDto {
  revision: number;
  at: string;
  ratings: OptionRatingDto[];
  preferredOptionId: string | null;
  reason: string;
}

/** The panel on one option; counts and range, so that nobody can be told apart. */
export class OptionFiguresDto {
  optionId: string;
  title: string;
  n: number;
  median: number | null;
  low: number | null;
  high: number | null;
  /** All ratings, sorted. */
  values: number[];
  preferredBy: number;
}

export class BallotReasonDto {
  text: string;
  /** Where the conference's setting shows names. */
  person: PersonRefDto | null;
}

export class RoundOptionDto {
  id: string;
  title: string;
  description: string;
  isProposal: boolean;
}

export class RoundDto {
  id: string;
  number: number;
  @ApiProperty({ enum: ['open', 'closed'] }) state: 'open' | 'closed';
  openedAt: string;
  closedAt: string | null;
  caseVersion: number;
  options: RoundOptionDto[];
  /** Ratings in, of so many who may rate. */
  given: number;
  eligible: number;
  mine: BallotDto | null;
  /** My earlier ones in this round. */
  earlier: BallotDto[];
  /** Null while blind: until the own rating is in, or the round is closed. */
  figures: OptionFiguresDto[] | null;
  reasons: BallotReasonDto[] | null;
}

export class RatingDto {
  rounds: RoundDto[];
  mayRate: boolean;
}
