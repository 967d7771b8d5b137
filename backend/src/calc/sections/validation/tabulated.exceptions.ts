export interface Exception {
  family: string;
  designation: string;
  column: string;
  reason: string;
}

/** Printed values beyond the stated tolerance, one by one; the test fails when one of them comes to agree. */
export const exceptions: Exception[] = [
  { family: 'IPE', designation: 'IPE AA 80', column: 'mass_kg_m', reason: '4.950 computed from the dimensions; printed 4.9: the last figure is 2 % of the value' },
  { family: 'IPE', designation: 'IPE A 80', column: 'Iw_dm6', reason: '0.0000933 computed; printed to one figure, 0.00009' },
  { family: 'IPE', designation: 'IPE AA 80', column: 'Iw_dm6', reason: '0.0000933 computed; printed to one figure, 0.00009' },
  { family: 'IPE', designation: 'IPE R 180', column: 'It_cm4', reason: 'printed with a larger allowance for the fillets: 8.15 against 7.63; A, I and W agree' },
  { family: 'IPE', designation: 'IPE R 500', column: 'It_cm4', reason: 'printed with a larger allowance for the fillets: 171 against 162.3; A, I and W agree' },
  { family: 'UPN', designation: 'UPN 50', column: 'Wel_z_cm3', reason: 'printed to a whole number, 4; computed 3.74' },
  { family: 'UPE', designation: 'UPE 100', column: 'Wel_z_cm3', reason: 'printed to a whole number, 11; computed 10.6' },
  { family: 'UPE', designation: 'UPE 160', column: 'Wel_z_cm3', reason: 'printed to a whole number, 23; computed 22.6' },
  { family: 'UPE', designation: 'UPE 180', column: 'Wel_z_cm3', reason: 'printed to a whole number, 29; computed 28.6' },
  { family: 'L', designation: 'L 45x45x3', column: 'Iy_cm4', reason: 'its listed toe radius (3.5) exceeds its thickness (3), and is taken as the thickness: 1.52 % high' },
  { family: 'L', designation: 'L 45x45x3', column: 'Iz_cm4', reason: 'as for I_y' },
  { family: 'W', designation: 'W150x18', column: 'Iz_cm4', reason: '125.9 computed; the printed 124 does not follow from the printed flange (2·7.1·102³/12 = 125.6)' },
];
