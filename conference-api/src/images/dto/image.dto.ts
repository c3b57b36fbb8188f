import { ApiProperty } from '@nestjs/swagger';
import { PROJECTIONS, type Projection } from '../../calc/vocabulary/images.js';
import { OptionalInteger, OptionalOneOf, OptionalText } from '../../common/validation/fields.js';

/** Short-lived signed addresses; the same for an hour, so that a browser can keep what it fetched. */
export class ImageAddressesDto {
  thumb: string;
  view: string;
  full: string;
}

export class ImageDto {
  id: string;
  @ApiProperty({ enum: PROJECTIONS }) projection: Projection;
  interval: string;
  caption: string;
  position: number;
  width: number;
  height: number;
  pixelSpacingMm: number | null;
  uploadedAt: string;
  addresses: ImageAddressesDto;
}

export class ImageListDto {
  items: ImageDto[];
}

/** Fields beside the file in the multipart body. */
export class UploadImageDto {
  @OptionalOneOf(PROJECTIONS) projection?: Projection;
  /** As an interval, never a date. */
  @OptionalText(120) interval?: string;
  @OptionalText(300) caption?: string;
}

export class UpdateImageDto extends UploadImageDto {
  @OptionalInteger(0, 1000) position?: number;
}
