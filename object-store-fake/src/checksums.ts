import { createHash } from 'node:crypto';
import { crc32 } from 'node:zlib';

export const CHECKSUM_ALGORITHMS = ['crc32', 'crc32c', 'crc64nvme', 'sha1', 'sha256'] as const;
export type ChecksumAlgorithm = (typeof CHECKSUM_ALGORITHMS)[number];

/** Base64 values by algorithm, as S3 sends them. */
export type Checksums = Partial<Record<ChecksumAlgorithm, string>>;

export interface RunningChecksum {
  update(data: Buffer): void;
  digest(): Buffer;
}

export const CHECKSUM_BYTES: Record<ChecksumAlgorithm, number> = {
  crc32: 4,
  crc32c: 4,
  crc64nvme: 8,
  sha1: 20,
  sha256: 32,
};

export function isChecksumAlgorithm(name: string): name is ChecksumAlgorithm {
  return (CHECKSUM_ALGORITHMS as readonly string[]).includes(name);
}

export function startChecksum(algorithm: ChecksumAlgorithm): RunningChecksum {
  switch (algorithm) {
    case 'crc32':
      return new Crc32();
    case 'crc32c':
      return new Crc32c();
    case 'crc64nvme':
      return new Crc64Nvme();
    default: {
      const hash = createHash(algorithm);
      return { update: (data) => void hash.update(data), digest: () => hash.digest() };
    }
  }
}

class Crc32 implements RunningChecksum {
  private value = 0;

  update(data: Buffer): void {
    this.value = crc32(data, this.value);
  }

  digest(): Buffer {
    return uint32(this.value);
  }
}

// Castagnoli's polynomial, reflected (RFC 3720 appendix B.4).
const CRC32C_TABLE = Uint32Array.from({ length: 256 }, (_, index) => {
  let value = index;
  for (let bit = 0; bit < 8; bit += 1) value = value & 1 ? (value >>> 1) ^ 0x82f63b78 : value >>> 1;
  return value;
});

class Crc32c implements RunningChecksum {
  private value = 0xffffffff;

  update(data: Buffer): void {
    let value = this.value;
    for (const byte of data) value = (CRC32C_TABLE[(value ^ byte) & 0xff] ?? 0) ^ (value >>> 8);
    this.value = value;
  }

  digest(): Buffer {
    return uint32(this.value ^ 0xffffffff);
  }
}

// The polynomial of the NVM Express specification, reflected; halves, since numbers hold 32 bits exactly in bit operations.
const CRC64_POLYNOMIAL = 0x9a6c9329ac4bc9b5n;
const CRC64_TABLE = Array.from({ length: 256 }, (_, index) => {
  let value = BigInt(index);
  for (let bit = 0; bit < 8; bit += 1) value = value & 1n ? (value >> 1n) ^ CRC64_POLYNOMIAL : value >> 1n;
  return value;
});
const CRC64_HIGH = Uint32Array.from(CRC64_TABLE, (value) => Number(value >> 32n));
const CRC64_LOW = Uint32Array.from(CRC64_TABLE, (value) => Number(value & 0xffffffffn));

class Crc64Nvme implements RunningChecksum {
  private high = 0xffffffff;
  private low = 0xffffffff;

  update(data: Buffer): void {
    let { high, low } = this;
    for (const byte of data) {
      const index = (low ^ byte) & 0xff;
      low = ((low >>> 8) | (high << 24)) ^ (CRC64_LOW[index] ?? 0);
      high = (high >>> 8) ^ (CRC64_HIGH[index] ?? 0);
    }
    this.high = high;
    this.low = low;
  }

  digest(): Buffer {
    return Buffer.concat([uint32(this.high ^ 0xffffffff), uint32(this.low ^ 0xffffffff)]);
  }
}

function uint32(value: number): Buffer {
  const bytes = Buffer.alloc(4);
  bytes.writeUInt32BE(value >>> 0);
  return bytes;
}
