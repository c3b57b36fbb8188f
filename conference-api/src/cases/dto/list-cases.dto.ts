import { Transform } from 'class-transformer';
import { IsBoolean, IsIn, IsOptional, IsString, IsUUID, MaxLength } from 'class-validator';
import { JOINTS, type Joint, type Stage, STAGES, URGENCIES, type Urgency } from '../../calc/vocabulary/case.js';
import { PageQueryDto } from '../../common/paging/page-query.dto.js';

export const CASE_SORTS = ['updated', 'released', 'urgency', 'code'] as const;
export type CaseSort = (typeof CASE_SORTS)[number];

const asList = ({ value }: { value: unknown }) => (typeof value === 'string' ? value.split(',').filter(Boolean) : value);
const asFlag = ({ value }: { value: unknown }) => (value === 'true' ? true : value === 'false' ? false : value);

export class ListCasesDto extends PageQueryDto {
  @IsOptional()
  @IsUUID()
  conferenceId?: string;

  /** One or more, with commas between. */
  @IsOptional()
  @Transform(asList)
  @IsIn(STAGES, { each: true })
  stage?: Stage[];

  @IsOptional()
  @IsIn(JOINTS)
  joint?: Joint;

  @IsOptional()
  @IsIn(URGENCIES)
  urgency?: Urgency;

  @IsOptional()
  @Transform(asFlag)
  @IsBoolean()
  mine?: boolean;

  @IsOptional()
  @Transform(asFlag)
  @IsBoolean()
  awaitingMyRating?: boolean;

  /** Words to be found in the case. */
  @IsOptional()
  @IsString()
  @MaxLength(200)
  query?: string;

  @IsOptional()
  @IsIn(CASE_SORTS)
  sort?: CaseSort;

  @IsOptional()
  @IsIn(['asc', 'desc'])
  order?: 'asc' | 'desc';
}
