import { Body, Controller, Delete, Get, HttpCode, Param, Patch, Post, Query, Res, UploadedFile, UseInterceptors } from '@nestjs/common';
import { FileInterceptor } from '@nestjs/platform-express';
import { ApiBody, ApiConsumes, ApiProduces, ApiTags } from '@nestjs/swagger';
import type { Response } from 'express';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { CurrentActor } from '../common/decorators/current-actor.decorator.js';
import { Public, RequirePermission } from '../common/decorators/route-access.decorator.js';
import { IdPipe } from '../common/pipes/path-pipes.js';
import { SignedAddressDto } from './dto/signed-address.dto.js';
import { ImageDto, ImageListDto, UpdateImageDto, UploadImageDto } from './dto/image.dto.js';
import { ImageFilesService } from './image-files.service.js';
import { ImagesService } from './images.service.js';
import { UploadGate } from './upload-gate.interceptor.js';

@ApiTags('images')
@Controller()
export class ImagesController {
  constructor(
    private readonly images: ImagesService,
    private readonly files: ImageFilesService,
  ) {}

  @Get('cases/:caseId/images')
  @RequirePermission(Permission.CaseRead)
  findOfCase(@CurrentActor() actor: Actor, @Param('caseId', IdPipe) caseId: string): Promise<ImageListDto> {
    return this.images.findOfCase(actor, caseId);
  }

  /** One file; its kind is decided by its content, its metadata are dropped. */
  @Post('cases/:caseId/images')
  @RequirePermission(Permission.ImageWrite)
  @UseInterceptors(UploadGate, FileInterceptor('file'))
  @ApiConsumes('multipart/form-data')
  @ApiBody({
    schema: {
      type: 'object',
      required: ['file'],
      properties: { file: { type: 'string', format: 'binary' }, projection: { type: 'string' }, interval: { type: 'string' }, caption: { type: 'string' } },
    },
  })
  upload(
    @CurrentActor() actor: Actor,
    @Param('caseId', IdPipe) caseId: string,
    @UploadedFile() file: Express.Multer.File | undefined,
    @Body() body: UploadImageDto,
  ): Promise<ImageDto> {
    return this.images.upload(actor, caseId, file, body);
  }

  @Patch('images/:id')
  @RequirePermission(Permission.ImageWrite)
  update(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string, @Body() body: UpdateImageDto): Promise<ImageDto> {
    return this.images.update(actor, id, body);
  }

  @Delete('images/:id')
  @HttpCode(204)
  @RequirePermission(Permission.ImageWrite)
  remove(@CurrentActor() actor: Actor, @Param('id', IdPipe) id: string): Promise<void> {
    return this.images.remove(actor, id);
  }

  /** The picture itself, for whoever holds an address that was signed for them and has not expired. */
  @Get('images/:id/file/:size')
  @Public()
  @ApiProduces('image/webp', 'image/png')
  file(
    @Param('id', IdPipe) id: string,
    @Param('size') size: string,
    @Query() query: SignedAddressDto,
    @Res() response: Response,
  ): Promise<void> {
    return this.files.send(id, size, query, response);
  }
}
