import { Problem } from '../common/problems/problem.js';

/** The file is of a kind that is read, but this one is not. */
export const unreadable = (detail: string) => new Problem('invalid', detail, [{ field: 'file', code: 'unreadable-image', message: detail }]);
