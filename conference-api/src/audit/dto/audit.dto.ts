import { ApiProperty } from '@nestjs/swagger';
import { IsOptional, IsString, IsUUID, MaxLength } from 'class-validator';
import { PageQueryDto } from '../../common/paging/page-query.dto.js';

export class ListAuditDto extends PageQueryDto {
  @IsOptional()
  @IsUUID()
  personId?: string;

  @IsOptional()
  @IsUUID()
  caseId?: string;

  /** For example case.post. */
  @IsOptional()
  @IsString()
  @MaxLength(60)
  action?: string;
}

export class AuditEntryDto {
  id: string;
  at: string;
  personId: string | null;
  personName: string | null;
  action: string;
  recordKind: string;
  recordId: string;
  caseId: string | null;
  address: string;
  @ApiProperty({ type: 'object', additionalProperties: true }) details: Record<string, unknown>;
}

export class AuditListDto {
  items: AuditEntryDto[];
  nextCursor: string | null;
}
