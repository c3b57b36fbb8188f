import { Module } from '@nestjs/common';
import { ImagesController } from './images.controller.js';
import { ImagesService } from './images.service.js';
import { ImageFilesService } from './image-files.service.js';

@Module({
  controllers: [ImagesController],
  providers: [ImagesService, ImageFilesService],
  exports: [ImagesService, ImageFilesService],
})
export class ImagesModule {}
