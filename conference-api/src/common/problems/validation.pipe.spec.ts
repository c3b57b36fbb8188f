import { Type } from 'class-transformer';
import { IsArray, IsInt, IsString, MaxLength, Min, ValidateNested } from 'class-validator';
import { Problem } from './problem.js';
import { validationPipe } from './validation.pipe.js';

class Item {
  @IsInt()
  @Min(1)
  minutes: number;
}

class Body {
  @IsString()
  @MaxLength(5)
  title: string;

  @IsArray()
  @ValidateNested({ each: true })
  @Type(() => Item)
  items: Item[];
}

const refusal = async (body: unknown) => {
  try {
    await validationPipe().transform(body, { type: 'body', metatype: Body });
    throw new Error('nothing was refused');
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
    return error.errors;
  }
};

describe('the validation pipe', () => {
  it('names each field once, by what is wrong with it first', async () => {
    expect(await refusal({ items: [{ minutes: 0 }, { minutes: 'x' }], name: 'y' })).toEqual([
      { field: 'name', code: 'unknown-field', message: expect.stringContaining('name') },
      { field: 'title', code: 'required', message: 'title is missing.' },
      { field: 'items[0].minutes', code: 'min', message: expect.any(String) },
      { field: 'items[1].minutes', code: 'is-int', message: expect.any(String) },
    ]);
  });

  it('says of a number that it should be text, not that it is too long', async () => {
    expect(await refusal({ title: 7, items: [] })).toEqual([{ field: 'title', code: 'is-string', message: 'title must be a string.' }]);
  });
});
