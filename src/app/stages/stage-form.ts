import { FormControl, FormGroup } from '@angular/forms';
import type { FieldSpec, ValueOf } from './field-spec.ts';
import { FIELD_PATHS, type FIELDS, type FieldPath, type StageFormValue } from './stage-fields.ts';

type Controls = {
  [P in FieldPath]: FormControl<ValueOf<(typeof FIELDS)[P] & FieldSpec>>;
};
/** The typed form over a whole stage, one control per field of the table. */
export type StageForm = FormGroup<Controls>;

/** A form that holds the value. */
export function stageForm(value: StageFormValue): StageForm {
  const controls = FIELD_PATHS.map((path) => [
    path,
    new FormControl(value[path] as unknown, { nonNullable: true }),
  ]);
  return new FormGroup(Object.fromEntries(controls) as Controls);
}
