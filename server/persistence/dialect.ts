/**
 * The few expressions that another database would spell differently stand here.
 *
 * @param column an alias and property of a query, never anything from outside
 * @param key a member of the JSON document in that column
 */
export function jsonText(column: string, key: string): string {
  return `json_extract(${column}, '$.${key}')`;
}
