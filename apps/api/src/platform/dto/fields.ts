export {
  Choice,
  Flag,
  Id,
  ID_SCHEMA,
  Instant,
  LocalDateField,
  MailAddress,
  Text,
  WholeNumber,
} from './scalar-fields.js';
export { ListOf, ListOfChoices, ListOfIds, Nested, OpenObject } from './nested-fields.js';
export type { FieldOptions } from './field-options.js';
