import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class ImagesService {
  findOfCase(..._: unknown[]): any {
    throw new Error('ImagesService.findOfCase is not written yet');
  }
  upload(..._: unknown[]): any {
    throw new Error('ImagesService.upload is not written yet');
  }
  update(..._: unknown[]): any {
    throw new Error('ImagesService.update is not written yet');
  }
  remove(..._: unknown[]): any {
    throw new Error('ImagesService.remove is not written yet');
  }
}
