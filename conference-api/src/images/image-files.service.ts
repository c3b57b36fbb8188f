import { Injectable } from '@nestjs/common';

// STUB: replace whole
@Injectable()
export class ImageFilesService {
  send(..._: unknown[]): any {
    throw new Error('ImageFilesService.send is not written yet');
  }
}
