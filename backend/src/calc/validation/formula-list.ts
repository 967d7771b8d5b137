import type { Formula } from '../formula.js';
import { sectionFactorFormula } from '../methods/explain-member.js';
import { takeoffFormulas } from '../methods/takeoff-formulas.js';
import { regressionThickness, regressionTime } from '../standards/en-13381/regression.js';
import { accidentalCombinationFormula } from '../standards/en-1990/clause-6-4-3-3-accidental.js';
import { slowHeatingCurve } from '../standards/en-1363-2/slow-heating-curve.js';
import { astmE119Curve } from '../standards/astm-e119/time-temperature-table.js';
import {
  burningTimeFormula, fuelControlledTimeFactorFormula, parametricCoolingFormula, parametricHeatingFormula, timeFactorFormula,
} from '../standards/en-1991-1-2/annex-a-parametric.js';
import { netHeatFluxFormula } from '../standards/en-1991-1-2/clause-3-1-net-heat-flux.js';
import { externalCurve, hydrocarbonCurve, standardCurve } from '../standards/en-1991-1-2/clause-3-2-nominal-curves.js';
import { reductionFactorFormula, utilisationFromAmbientFormula } from '../standards/en-1993-1-2/clause-2-4-2-reduction-factor.js';
import { steelConductivityFormula, steelSpecificHeatFormula } from '../standards/en-1993-1-2/clause-3-4-1-thermal-properties.js';
import { coldBucklingReductionFormula, imperfectionFactors } from '../standards/en-1993-1-1/table-6-1.js';
import { fireEpsilonFormula } from '../standards/en-1993-1-2/clause-4-2-2-classification.js';
import { tensionResistanceFormula } from '../standards/en-1993-1-2/clause-4-2-3-1-tension.js';
import { bucklingReductionFormula, compressionResistanceFormula, slendernessFormula, slendernessInFireFormula } from '../standards/en-1993-1-2/clause-4-2-3-2-compression.js';
import { bendingResistanceFormula, shearReductionFormula, shearResistanceFormula } from '../standards/en-1993-1-2/clause-4-2-3-3-bending.js';
import { criticalTemperatureFormula } from '../standards/en-1993-1-2/clause-4-2-4-critical-temperature.js';
import { criticalMomentFormula, heldAxisCriticalMomentFormula, lateralSlendernessFormula } from '../standards/en-1993-1-1/clause-6-3-2-2-critical-moment.js';
import { elasticCrossSectionFormula, plasticCrossSectionFormula } from '../standards/en-1993-1-1/clause-6-2-9-bending-and-axial.js';
import { lateralBucklingResistanceFormula, lateralReductionFormula, lateralSlendernessInFireFormula } from '../standards/en-1993-1-2/clause-4-2-3-3-lateral-torsional.js';
import {
  amplificationFormula, interactionFormula, lateralAmplificationFormula, muLtFormula, muYFormula, muZFormula,
} from '../standards/en-1993-1-2/clause-4-2-3-5-beam-columns.js';
import { unprotectedStepFormula } from '../standards/en-1993-1-2/clause-4-2-5-1-unprotected.js';
import { heatRatioFormula, moistureDwellFormula, protectedStepFormula } from '../standards/en-1993-1-2/clause-4-2-5-2-protected.js';

/** What the documents need of a formula, whatever its inputs. */
export type PrintedFormula = Pick<Formula<Record<string, unknown>>, 'label' | 'source' | 'expression' | 'result' | 'symbols'>;
export interface FormulaChapter {
  title: string;
  formulas: PrintedFormula[];
}
const printed = <I extends object>(f: Formula<I>): PrintedFormula => f as unknown as PrintedFormula;

export const formulaChapters: FormulaChapter[] = [
  { title: 'Actions in fire', formulas: [printed(accidentalCombinationFormula), printed(reductionFactorFormula), printed(utilisationFromAmbientFormula)] },
  {
    title: 'Fire curves',
    formulas: [
      printed(standardCurve), printed(externalCurve), printed(hydrocarbonCurve), printed(slowHeatingCurve), printed(astmE119Curve), printed(timeFactorFormula),
      printed(burningTimeFormula), printed(parametricHeatingFormula), printed(fuelControlledTimeFactorFormula), printed(parametricCoolingFormula),
    ],
  },
  {
    title: 'Steel in the fire',
    formulas: [
      printed(sectionFactorFormula), printed(netHeatFluxFormula), printed(steelSpecificHeatFormula), printed(steelConductivityFormula), printed(unprotectedStepFormula),
      printed(heatRatioFormula), printed(protectedStepFormula), printed(moistureDwellFormula),
    ],
  },
  {
    title: 'Resistance and critical temperature',
    formulas: [
      printed(fireEpsilonFormula), printed(tensionResistanceFormula), printed(slendernessFormula), printed(slendernessInFireFormula), printed(bucklingReductionFormula), printed(coldBucklingReductionFormula),
      printed(compressionResistanceFormula), printed(bendingResistanceFormula), printed(shearReductionFormula), printed(shearResistanceFormula), printed(criticalMomentFormula), printed(heldAxisCriticalMomentFormula),
      printed(lateralSlendernessFormula), printed(lateralSlendernessInFireFormula), printed(lateralReductionFormula), printed(lateralBucklingResistanceFormula), printed(plasticCrossSectionFormula), printed(elasticCrossSectionFormula), printed(muYFormula), printed(muZFormula),
      printed(muLtFormula), printed(amplificationFormula), printed(lateralAmplificationFormula), printed(interactionFormula), printed(criticalTemperatureFormula),
    ],
  },
  { title: 'Protection', formulas: [printed(regressionTime), printed(regressionThickness)] },
  { title: 'Quantities', formulas: takeoffFormulas.map((f) => printed(f as unknown as Formula<Record<string, unknown>>)) },
];

export const tablesRead: [string, string][] = [
  ['EN 1993-1-2:2005 Table 3.1', 'k_y, k_p, k_E of carbon steel, linear between rows; k_y and k_E also read backwards, exactly'],
  ['EN 1993-1-1:2005 Table 3.1', 'yield strength of S235, S275, S355, S420, S460 to 40 and to 80 mm'],
  ['ASTM A36, A992, A500 grade C (memory)', 'yield strength 250, 345, 345 MPa'],
  ['EN 1993-1-1:2005 Table 5.2', 'limits of c/t and d/t for classes 1 to 3, with ε of EN 1993-1-2 4.2.2'],
  ['EN 1993-1-1:2005 Tables 6.1, 6.2 (memory)', `imperfection factors of the cold buckling curves ${Object.entries(imperfectionFactors).map(([curve, alpha]) => `${curve} ${alpha}`).join(', ')}; the most favourable curve of a shape, where a cold utilisation is carried over to fire`],
  ['EN 1993-1-2:2005 4.2.3.3(7), (8)', 'κ1: 1.0; 0.85 protected and 0.7 bare with a slab on the fourth side, for beams alone. κ2: 0.85 over the supports of a continuous beam, else 1.0'],
  ['EN 1993-1-2:2005 4.2.3.2(5)', 'buckling length of a braced continuous column: 0.5 between storeys, 0.7 at the top, where the engineer confirms the rule'],
  ['EN 1991-1-2:2002 3.2, 3.3.1.1(3)', 'α_c: 25 W/m²K; 50 for the hydrocarbon curve; 35 for parametric fires'],
];

export const decisions: string[] = [
  'γ_M0 = 1.0. γ_M,fi, every ψ, η_fi, the class 4 temperature and the defaults by member type are settings of the project.',
  'The critical temperature is the highest uniform steel temperature at which every limit state still carries its effect; the lowest governs. A member that fails at 20 °C is under-strength cold and has none.',
  'A variable action that acts favourably is left out, effect by effect; an axial force that can turn its sign is checked both ways.',
  'Both axes share one buckling curve in fire, so the more slender axis governs at every temperature and is the one reported.',
  'High shear (above half the shear resistance at temperature) reduces the bending resistance by EN 1993-1-1 6.2.8.',
  'M_cr of a length between lateral supports comes from its own moment diagram and the height of its loads, by least energy over a series for the twist (Rayleigh and Ritz); C_1 and C_2 printed beside it are the numbers that give the same M_cr in the general expression. Ends are held sideways and against twist, free to warp and to turn in plan; neighbouring lengths lend no help. A cantilever with a free tip is built in at its root, free to warp there.',
  'A described beam is of one stiffness throughout; its loads are combined for every choice of variable actions present, each in turn leading, and the worst governs. Moment and shear are checked together place by place; κ2 holds at built-in ends of propped and fixed beams.',
  'Where only effects are given, a beam held at points is under uniform moment and its loads are on the top flange, unless said otherwise.',
  'Bending with compression (4.2.3.5): both expressions, and the cross-section by EN 1993-1-1 6.2.9 with the strength at temperature. The class is found with the force in fire and f_y at 20 °C. The slenderness in μ_y is not capped at 1.1, which is the safe side. β_M of a described beam takes 1.3 for its loads, and 1.1 for lateral-torsional buckling.',
  'Class 4 (4.2.3.6): the lower of the project’s setting and of what the gross section would carry, in bending and compression; tension has no class. Where only a utilisation is known the member’s type says how it is stressed: beams bend, columns and bracing are compressed, ties pull. A declared temperature stands.',
  'From a utilisation: beams and ties by (4.22) or by inverting k_y, as the project sets, μ0 below 0.013 read as 0.013. Columns and bracing may buckle, and so may a beam that is said to: there (4.22) does not hold, and they are read from the smaller of k_y and k_E, which is on the safe side for every slenderness.',
  'A cold utilisation rests on the resistance of EN 1993-1-1, μ0 on that of EN 1993-1-2 at 20 °C, which is the smaller for members that buckle (its one curve lies below the cold ones) and for sections whose class is worse with the reduced ε. μ0 = η_fi·E_d/R_d is divided by the least R_fi,d,0/R_d: of all slendernesses, against the most favourable cold curve of the shape; W_el/W_pl where class 1 or 2 becomes 3. Above 1 the member is not determined. A beam that may buckle needs its utilisation in fire.',
  'Above a utilisation of 1, in fire or cold, a member is under-strength cold.',
  'Equation (4.25) is stepped at 5 s and (4.27) at 30 s or less, with the gas temperature at the middle of each step. A_m/V below 10 1/m is read as 10 in (4.25).',
  'Conductivity given by temperature is read at the mean of gas and steel temperature.',
  'Natural fires are judged on the peak steel temperature over the whole fire.',
];

export const refused: string[] = [
  'lateral-torsional buckling of shapes other than I, rectangular hollow and box with equal flanges (square and circular hollow sections need no such check); a cantilever held along its length with a free tip',
  'torsion; shear parallel to the weak axis',
  'composite members; web openings',
  'resistance of unequal I sections, channels, tees, angles, flats and rounds (their section factor and heating are computed; give a utilisation, of a beam that may buckle marked as such, or declare the temperature)',
  'shear in webs above h/t = 72·√(235/f_y), which may buckle in shear',
  'the buckling lengths of braced continuous columns (4.2.3.2(5)) for anything but a column',
  'compression without both buckling lengths; members without actions; classification of a flat',
  'steel above 80 mm and grades not listed; stainless, cold-formed and cast steel',
];
