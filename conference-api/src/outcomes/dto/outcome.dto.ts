import { ApiProperty } from '@nestjs/swagger';
import { ArrayMaxSize, IsArray, IsInt, Matches, Max, Min } from 'class-validator';
import { DEFECT_CLASS } from '../../calc/vocabulary/case-content.js';
import { BLOOD_LOSS_BANDS, COMPLICATIONS, type OutcomeContent } from '../../calc/vocabulary/outcomes.js';
import { PersonRefDto } from '../../common/people/person-ref.dto.js';
import { OptionalFlag, OptionalInteger, OptionalNames, OptionalNumber, OptionalOneOf, OptionalText, RequiredList } from '../../common/validation/fields.js';

export class OutcomeStepDto {
  @Matches(/^[A-Za-z0-9_-]{1,40}$/)
  stepId: string;
  @OptionalText(1000) method: string;
  @OptionalFlag() asPlanned: boolean | null;
}

export class WriteOutcomeDto {
  @RequiredList(() => OutcomeStepDto, 40) steps: OutcomeStepDto[];
  @OptionalText(2000) missingKit?: string;
  @OptionalInteger(1, 1440) minutes?: number | null;
  @OptionalOneOf(BLOOD_LOSS_BANDS) bloodLoss?: OutcomeContent['bloodLoss'];
  @OptionalNames(COMPLICATIONS) complications?: OutcomeContent['complications'];
  @OptionalOneOf(DEFECT_CLASS) defectFound?: string | null;
  @OptionalNumber(20, 100) removedShellMm?: number | null;
  @OptionalNumber(20, 100) implantedShellMm?: number | null;
  /** Hours of the rim clock where bone was lost. */
  @IsArray()
  @ArrayMaxSize(12)
  @IsInt({ each: true })
  @Min(1, { each: true })
  @Max(12, { each: true })
  boneLostHours: number[];
  @OptionalText(2000) cultures?: string;
  @OptionalText(4000) lesson?: string;
  /** Required where an outcome is there already. */
  @OptionalText(2000) amendmentReason?: string;
}

export class OutcomeDto {
  id: string;
  version: number;
  steps: OutcomeStepDto[];
  missingKit: string;
  minutes: number | null;
  @ApiProperty({ enum: Object.keys(BLOOD_LOSS_BANDS), nullable: true }) bloodLoss: string | null;
  complications: string[];
  defectFound: string | null;
  removedShellMm: number | null;
  implantedShellMm: number | null;
  boneLostHours: number[];
  cultures: string;
  lesson: string;
  amendmentReason: string | null;
  by: PersonRefDto;
  at: string;
}

export class OutcomeListDto {
  items: OutcomeDto[];
}
