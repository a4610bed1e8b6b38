import { Column } from 'typeorm';
import type { Verdict } from '../../shared/checks/evaluation.ts';
import type { RowFigures } from './row-figures.ts';

/** Columns lists query by, written with definition and evaluation. */
export abstract class RevisionFigures implements RowFigures {
  @Column({ type: 'text' }) title!: string;

  @Column({ type: 'integer' }) quantity!: number;

  @Column({ type: 'text' }) topology!: string;

  @Column({ type: 'text', name: 'load_kind' }) loadKind!: string;

  @Column({ type: 'text', name: 'load_text' }) loadText!: string;

  @Column({ type: 'text' }) transistor!: string;

  @Column({ type: 'real', name: 'base_resistor_ohm', nullable: true })
  baseResistorOhm!: number | null;

  @Column({ type: 'real', name: 'overdrive_factor', nullable: true })
  overdriveFactor!: number | null;

  @Column({ type: 'real', name: 'vce_sat_v', nullable: true }) vceSatV!: number | null;

  @Column({ type: 'real', name: 'power_w', nullable: true }) powerW!: number | null;

  @Column({ type: 'text' }) verdict!: Verdict;

  @Column({ type: 'text', name: 'least_criterion', nullable: true }) leastCriterion!: string | null;

  @Column({ type: 'real', name: 'least_margin', nullable: true }) leastMargin!: number | null;

  @Column({ type: 'text', nullable: true }) port!: string | null;

  @Column({ type: 'real', name: 'port_current_a', nullable: true }) portCurrentA!: number | null;

  @Column({ type: 'real', name: 'port_limit_a', nullable: true }) portLimitA!: number | null;
}
