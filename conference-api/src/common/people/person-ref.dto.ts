import { ApiProperty } from '@nestjs/swagger';
import { DISCIPLINES, type Discipline } from '../../calc/vocabulary/people.js';

/** A person as others see them. */
export class PersonRefDto {
  id: string;
  name: string;
  @ApiProperty({ enum: DISCIPLINES })
  discipline: Discipline;
  unit: string;
}
