import { annulus } from './annulus';
import { bankDrop } from './bank-drop';
import { boilingFlow } from './boiling-flow';
import { boilingPool } from './boiling-pool';
import { coilAndCurved } from './coil-and-curved';
import { condensation } from './condensation';
import { conductionShape } from './conduction-shape';
import { dimensionlessGroup } from './dimensionless-group';
import { ductShapes } from './duct-shapes';
import { entranceRegion } from './entrance-region';
import { exchangerEffectiveness } from './exchanger-effectiveness';
import { exchangerFt } from './exchanger-ft';
import { externalBluff } from './external-bluff';
import { externalCylinder } from './external-cylinder';
import { externalPlate } from './external-plate';
import { finEfficiency } from './fin-efficiency';
import { finnedBank } from './finned-bank';
import { frictionInternal } from './friction-internal';
import { highSpeed } from './high-speed';
import { insulation } from './insulation';
import { internalLaminar } from './internal-laminar';
import { internalTransition } from './internal-transition';
import { internalTurbulent } from './internal-turbulent';
import { jet } from './jet';
import { liquidMetal } from './liquid-metal';
import { minorLosses } from './minor-losses';
import { mixedConvection } from './mixed-convection';
import { naturalChannel } from './natural-channel';
import { naturalCylinderSphere } from './natural-cylinder-sphere';
import { naturalEnclosure } from './natural-enclosure';
import { naturalPlate } from './natural-plate';
import { packedBed } from './packed-bed';
import { radiationExchange } from './radiation-exchange';
import { sphere } from './sphere';
import { transientConduction } from './transient-conduction';
import { tubeBank } from './tube-bank';
import { twoPhaseDrop } from './two-phase-drop';
import type { RelationFamily } from '../types';

/** All families, in the order in which the catalogue shows them. */
export const families: readonly RelationFamily[] = [
  internalLaminar,
  entranceRegion,
  internalTransition,
  internalTurbulent,
  frictionInternal,
  annulus,
  ductShapes,
  externalPlate,
  externalCylinder,
  sphere,
  externalBluff,
  tubeBank,
  bankDrop,
  finnedBank,
  packedBed,
  jet,
  coilAndCurved,
  naturalEnclosure,
  naturalChannel,
  naturalPlate,
  naturalCylinderSphere,
  finEfficiency,
  exchangerEffectiveness,
  exchangerFt,
  insulation,
  conductionShape,
  transientConduction,
  radiationExchange,
  boilingPool,
  boilingFlow,
  condensation,
  twoPhaseDrop,
  minorLosses,
  mixedConvection,
  highSpeed,
  liquidMetal,
  dimensionlessGroup,
];
