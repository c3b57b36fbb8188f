import sharp from 'sharp';

/** A picture that reads as a film of a hip with a shell, three screws and a stem: drawn here, of nobody. */
export async function drawFilm(side: 'left' | 'right'): Promise<Buffer> {
  const flip = side === 'left' ? '' : 'translate(900 0) scale(-1 1)';
  const drawing = `<svg xmlns="http://www.w3.org/2000/svg" width="900" height="1100">
    <rect width="900" height="1100" fill="#0b0b0b"/>
    <g transform="${flip}" stroke-linecap="round" fill="none">
      <path d="M120 120C260 40 520 60 640 260 680 360 640 430 560 470L300 560C220 520 120 330 120 120Z" fill="#7a7a7a"/>
      <path d="M430 620 470 1100 600 1100 610 640Z" fill="#8c8c8c"/>
      <path d="M380 560a150 150 0 0 1 300-60" stroke="#f4f4f4" stroke-width="34"/>
      <circle cx="530" cy="560" r="62" fill="#fbfbfb"/>
      <path d="M530 560 560 680 535 1060" stroke="#f6f6f6" stroke-width="46"/>
      <path d="M450 440 400 300M530 400 520 250M600 410 640 290" stroke="#f2f2f2" stroke-width="14"/>
    </g>
  </svg>`;
  return sharp(Buffer.from(drawing)).greyscale().png().toBuffer();
}
