import { Module } from '@nestjs/common';
import { MulterModule } from '@nestjs/platform-express';
import { memoryStorage } from 'multer';
import { Settings } from '../config/settings.js';
import { DicomRenderer } from './dicom-renderer.service.js';
import { ImageAddresses } from './image-addresses.js';
import { ImageFilesService } from './image-files.service.js';
import { ImageProcessor } from './image-processor.service.js';
import { ImageSweepService } from './image-sweep.service.js';
import { ImagesController } from './images.controller.js';
import { ImagesService } from './images.service.js';

@Module({
  imports: [
    MulterModule.registerAsync({
      inject: [Settings],
      // in memory only: what is not cleaned yet must not touch a disk
      useFactory: (settings: Settings) => ({
        storage: memoryStorage(),
        limits: { fileSize: settings.uploadMaxBytes, files: 1, fields: 10, fieldSize: 4096, parts: 12 },
      }),
    }),
  ],
  controllers: [ImagesController],
  providers: [ImagesService, ImageFilesService, ImageProcessor, DicomRenderer, ImageAddresses, ImageSweepService],
  exports: [ImagesService, ImageSweepService],
})
export class ImagesModule {}
