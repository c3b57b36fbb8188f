import { calculateRemovalGeometry } from '@kerfside/calc/geometry/removal-geometry.js';
import type { ImplantPart } from '@kerfside/calc/vocabulary/case-content.js';
import { quantity } from '@/lib/units';
import { FigureFrame } from './figure-frame';
import { tryCalculation } from './try-calculation';

const NAME = 'Least volume of bone that goes, from the two diameters';

interface BoneVolumeProps {
  shell: ImplantPart | undefined;
  nextShellMm: number | null | undefined;
}

/** From the shell that comes out to the one expected next. Nothing where neither is given. */
export function BoneVolumeFigure({ shell, nextShellMm }: BoneVolumeProps) {
  const outer = shell?.outerDiameterMm;
  if (!outer && !nextShellMm) return null;
  const missing = [...(outer ? [] : ['outer diameter of the shell in place']), ...(nextShellMm ? [] : ['expected next shell'])];
  if (!outer || !nextShellMm) return <FigureFrame name={NAME} missing={missing}>Not computed</FigureFrame>;
  const { result, refusal } = tryCalculation(() => calculateRemovalGeometry({ shellOuterMm: outer, nextShellMm }));
  if (!result) return <FigureFrame name={NAME}>Not computed: {refusal}</FigureFrame>;
  const shape = shell?.shape && shell.shape !== 'hemispherical' ? ['The shell is not said to be hemispherical: the figure may not fit it.'] : [];
  return (
    <FigureFrame name={NAME} definition={result.definition} remarks={shape} cautions={result.cautions}>
      <strong>at least {quantity(result.boneCm3, 'volume')}</strong>, a layer of {quantity(result.radialMm, 'mm')} all round ({quantity(outer, 'mm')} to{' '}
      {quantity(nextShellMm, 'mm')})
    </FigureFrame>
  );
}
