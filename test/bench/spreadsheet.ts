import { demandOf, ohmPerMetre, type Design, type Dispenser, type Point } from '#calc';
import exceljs from 'exceljs';

/** Demand, plan and voltage of a lane as a spreadsheet computes them: the formula of each column, for a row. */
const FORMULAS: readonly (readonly [heading: string, formula: (row: number) => string])[] = [
  ['Mass g', (r) => `0.005*C${r}*D${r}`],
  ['Interval h', (r) => `F${r}*(14000000/(E${r}*SQRT(B${r}))-4*B${r})`],
  ['Demand µL/1000 h', (r) => `IF(G${r}>0,G${r},ROUNDUP(1000000*V${r}/(H${r}*W${r}),0))`],
  ['Exact interval ms', (r) => `3600000000*K${r}/X${r}`],
  ['Interval ms', (r) => `FLOOR(INT(Y${r}),60000)`],
  ['Pulses', (r) => `INT((L${r}-M${r})/K${r})`],
  ['Life h', (r) => `AA${r}*Z${r}/3600000`],
  ['Life d', (r) => `AB${r}/(I${r}*J${r}/7)`],
  ['Changes a year', (r) => `365.25/AC${r}`],
  ['Over-greasing %', (r) => `100*(Y${r}/Z${r}-1)`],
  ['Run ms', (r) => `ROUNDUP(K${r}/100,0)*N${r}`],
  ['Trunk Ω', (r) => `2*Q${r}*S${r}`],
  ['Own cable Ω', (r) => `2*R${r}*T${r}`],
  ['Drop V', (r) => `U${r}*O${r}*AG${r}+O${r}*AH${r}`],
  ['Volts', (r) => `24*0.98-AI${r}`],
  ['Margin V', (r) => `AJ${r}-P${r}`],
  ['Verdict', (r) => `IF(AK${r}<0,"too low",IF(AC${r}>365,"stays too long",IF(AC${r}<30,"too short","")))`],
];

const INPUTS = [
  'Tag', 'd mm', 'D mm', 'B mm', 'n rpm', 'K', 'Stated µL/1000 h', 'Density', 'Hours', 'Days', 'Dose µL', 'Cartridge µL', 'Residual µL', 'Run ms per step', 'Run A', 'Least V',
  'Trunk m', 'Cable m', 'Trunk Ω/m', 'Cable Ω/m', 'k',
];

/**
 * Writes a design as a workbook with a row a lane, inputs as values and everything else as formulas without a
 * cached result, so that whoever opens it must compute.
 *
 * @param path overwritten
 */
export async function writeSpreadsheet(design: Design, path: string): Promise<void> {
  const book = new exceljs.stream.xlsx.WorkbookWriter({ filename: path });
  const sheet = book.addWorksheet('Lanes');
  sheet.addRow([...INPUTS, ...FORMULAS.map(([heading]) => heading)]).commit();
  const inputs = inputReader(design);
  design.dispensers.forEach((dispenser, i) => {
    sheet.addRow([...inputs(dispenser), ...FORMULAS.map(([, formula]) => ({ formula: formula(i + 2) }))]).commit();
  });
  await book.commit();
}

/** Place of the demand in the rows of the recalculated sheet. */
export const DEMAND_COLUMN = INPUTS.length + 2;

function inputReader(design: Design): (dispenser: Dispenser) => (string | number)[] {
  const byId = <T extends { readonly id: string }>(rows: readonly T[]) => new Map(rows.map((row) => [row.id, row]));
  const [points, types, nodes, circuits, greases] = [byId(design.points), byId(design.dispenserTypes), byId(design.cableNodes), byId(design.circuits), byId(design.greases)];
  const trunkM = (id: string | null): number => {
    const node = id === null ? undefined : nodes.get(id);
    return node ? node.lengthM + trunkM(node.parentId) : 0;
  };
  const trunkOhm = ohmPerMetre(4, 5, design.project.voltageTempC);
  return (d) => {
    const point = points.get(d.pointId)!;
    const type = types.get(d.typeId ?? '') ?? design.dispenserTypes[0];
    const density = greases.get(point.greaseId ?? '')?.densityGPerCm3 ?? 0.9;
    const cableOhm = ohmPerMetre(d.crossSectionMm2 ?? 1.5, 5, design.project.voltageTempC);
    return [
      point.tag, ...bearingInputs(point, density), density, point.hoursPerDay ?? 16, point.daysPerWeek, d.doseUl ?? 300, d.cartridgeUl ?? 80_000, type.residualUl, type.runMsPerStep,
      type.runA, type.minV, trunkM(d.nodeId), d.cableLengthM ?? 10, trunkOhm, cableOhm, circuits.get(d.circuitId ?? '')?.concurrencyLimit ?? 25,
    ];
  };
}

/** Bearing and factor, or a stand-in where the demand is stated; then the stated demand, 0 where the bearing decides. */
function bearingInputs(point: Point, density: number): number[] {
  const { boreMm, outsideMm, widthMm, speedRpm, factors } = point;
  if (point.demandWay !== 'bearing' || boreMm === null || outsideMm === null || widthMm === null || speedRpm === null) {
    return [80, 140, 33, 100, 1, demandOf(point, density).demandUlPer1000h ?? 20_000];
  }
  const { temperature, contamination, moisture, vibration, position, design } = factors;
  return [boreMm, outsideMm, widthMm, speedRpm, temperature * contamination * moisture * vibration * position * design, 0];
}
