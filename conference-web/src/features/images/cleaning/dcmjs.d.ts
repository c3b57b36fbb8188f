/** The part of dcmjs that is used here; it brings no types of its own. */
declare module 'dcmjs' {
  export interface DicomValue {
    vr: string;
    Value: unknown[];
  }
  export type DicomValues = Record<string, DicomValue>;

  export interface DicomDict {
    meta: DicomValues;
    dict: DicomValues;
    write(options?: { fragmentMultiframe?: boolean; allowInvalidVRLength?: boolean }): ArrayBuffer;
  }

  const dcmjs: {
    data: {
      DicomDict: new (meta: DicomValues) => DicomDict;
      DicomMetaDictionary: { dictionary: Record<string, { name: string; vr: string } | undefined> };
    };
    log: { disableAll?: () => void };
  };
  export default dcmjs;
}
