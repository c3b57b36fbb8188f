/** PS3.3 C.12.1.1.2: the names of character sets → those of browsers. The last one of several with escapes. */
const LABELS: Record<string, string> = {
  '13': 'shift_jis',
  '58': 'gb2312',
  '87': 'iso-2022-jp',
  '100': 'windows-1252',
  '101': 'iso-8859-2',
  '109': 'iso-8859-3',
  '110': 'iso-8859-4',
  '126': 'iso-8859-7',
  '127': 'iso-8859-6',
  '138': 'iso-8859-8',
  '144': 'iso-8859-5',
  '148': 'iso-8859-9',
  '149': 'euc-kr',
  '159': 'iso-2022-jp',
  '166': 'windows-874',
  '192': 'utf-8',
  GB18030: 'gb18030',
  GBK: 'gbk',
};

/** For showing what was removed only: nothing that is decoded goes into a clean file. */
export function textDecoderFor(specificCharacterSet: string): TextDecoder {
  const names = specificCharacterSet.split('\\').map((name) => name.replace(/^ISO(_| 2022 )IR /, '').replace(/[\0 ]+$/, ''));
  const label = names
    .reverse()
    .map((name) => LABELS[name])
    .find(Boolean);
  return new TextDecoder(label ?? 'windows-1252');
}
