import { Injectable, ParseIntPipe, ParseUUIDPipe } from '@nestjs/common';
import { Problem } from '../problems/problem.js';

// an address with an id that can be none is an address of nothing
const nothingHere = () => new Problem('not-found', 'There is nothing at this address.');

/** An id in the path. */
@Injectable()
export class IdPipe extends ParseUUIDPipe {
  constructor() {
    super({ exceptionFactory: nothingHere });
  }
}

/** A whole number in the path. */
@Injectable()
export class NumberPipe extends ParseIntPipe {
  constructor() {
    super({ exceptionFactory: nothingHere });
  }
}
