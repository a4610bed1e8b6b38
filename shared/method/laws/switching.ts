import { law } from '../law.ts';

const CIRCUIT = 'Ohm’s and Kirchhoff’s laws';

/** Storage time, and the rising output of a level translator. */
export const SWITCHING_LAWS = {
  'storage-constant': law({
    result: 'tau_s',
    formula: 't_s0 / log((I_B1 + I_B2) / (I_Cr / h_r + I_B2))',
    name: 'Storage time constant of the switching row',
    validity: 'With the smallest hFE at 25 °C; 13 to 37 % high against a solver, the safe side.',
    source: 'Charge control',
  }),
  'vbe-least': law({
    result: 'V_BEm',
    formula: 'max(0, V_BEm25 + a_BE * (T_J - 25))',
    name: 'Smallest VBE over temperature',
    source: 'Common practice, −2 mV/K',
  }),
  'low-resistance': law({
    result: 'R_O',
    formula: 'V_d / I_OH',
    name: 'Resistance of the low output',
    source: 'Data sheet of the output: VOL',
  }),
  'left-npn': law({
    result: 'V_left',
    formula: 'V_BEm - V_OL - V_gs',
    name: 'Voltage that draws the base out',
    source: CIRCUIT,
  }),
  'left-pnp': law({
    result: 'V_left',
    formula: 'V_BEm - (V_S - V_r + V_unl)',
    name: 'Voltage that draws the base of a PNP out',
    source: CIRCUIT,
  }),
  'turn-off-current': law({
    result: 'I_out',
    formula: 'max(0, V_left) / (R_Bx + R_O) + V_BEm / R_BEx',
    name: 'Current out of the base at turn-off',
    source: CIRCUIT,
  }),
  'turn-off-shunt': law({
    result: 'I_out',
    formula: 'V_BEm / R_BEx',
    name: 'Current out of the base through RBE alone',
    source: CIRCUIT,
  }),
  'storage-warm': law({
    result: 's_w',
    formula: '1 + 0.005 * max(0, T_J - 25)',
    name: 'Growth of the storage time when warm',
    source: 'Judgement, +0.5 %/K',
    judgement: true,
  }),
  'storage-time': law({
    result: 't_s',
    formula: 's_w * tau_s * log((I_B + I_out) / (I_C / h_max + I_out))',
    name: 'Storage time in the circuit',
    validity: 'Saturated: IB above IC/hFE, else no storage.',
    source: 'Charge control',
  }),
  'storage-and-fall': law({
    result: 't_sf',
    formula: 't_s + t_f',
    name: 'Storage and fall time',
    source: 'Data-sheet row',
  }),
  'period-share': law({
    result: 'L',
    formula: '0.1 * min(D, 1 - D) / f',
    name: 'A tenth of the shorter part of the period',
    source: 'Common practice',
  }),
  'rise-constant': law({
    result: 'tau_r',
    formula: 'R_C * (C_in + C_w + C_ob)',
    name: 'Time constant of the rising output',
    source: CIRCUIT,
  }),
  'rise-time': law({
    result: 't_rise',
    formula: '2.2 * tau_r',
    name: 'Rise time, 10 to 90 %',
    source: 'Exponential of one time constant',
  }),
  'low-to-high': law({
    result: 't_LH',
    formula: 't_s + tau_r * log(max(1, (V_S - V_low) / (V_S - V_IH)))',
    name: 'Low-to-high delay',
    source: 'Storage time and the exponential rise',
  }),
} as const;
