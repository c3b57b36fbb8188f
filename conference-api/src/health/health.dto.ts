import { ApiProperty } from '@nestjs/swagger';

export class PartDto {
  @ApiProperty({ enum: ['up', 'down'] }) state: 'up' | 'down';
  milliseconds: number;
}

export class PartsDto {
  database: PartDto;
  objectStore: PartDto;
  mail: PartDto;
}

export class HealthDto {
  @ApiProperty({ enum: ['up', 'down'] }) state: 'up' | 'down';
  parts: PartsDto;
  /** Seconds since the oldest unsent mail was written; null where none waits or the database is down. */
  oldestUnsentMailSeconds: number | null;
}
