/**
 * What the architecture rules need to know of a source file, from a real parser (the one inside Vite), so that comments and
 * strings cannot fool them: imports, exports, names used from outside the file, and arithmetic that engines disagree on.
 */
import { parseSync } from 'vite';
import type { TextFile } from './project.ts';

/** One import or re-export: `from` as written; `names` as the other file exports them, `*` for all of them. */
export interface Import {
  readonly from: string;
  readonly names: readonly string[];
  /** Whether only types are imported, so that nothing of it is left in the running program. */
  readonly erased: boolean;
}

/** A name exported from another file under a name of this one; `*` as both for `export * from`. */
export interface Reexport extends Import {
  readonly as: readonly string[];
}

export interface Syntax {
  readonly path: string;
  readonly imports: readonly Import[];
  readonly reexports: readonly Reexport[];
  /** Names declared here and exported. */
  readonly exports: readonly string[];
  /** Those exports that are mere types which another declaration of the file mentions. */
  readonly mentionedTypes: readonly string[];
  /** Names used but declared nowhere in the file: globals. Also `Math.…` as written, `Math itself` where no member is named, `import.meta`, and `import(…)` of a computed name. */
  readonly globals: ReadonlySet<string>;
  /** Whether `**` or `**=` occurs. */
  readonly raisesPowers: boolean;
  /** Whether anything but re-exports stands at the top level. */
  readonly onlyReexports: boolean;
  /** Whether a comment comes before the first statement. */
  readonly hasHeader: boolean;
}

interface Node {
  readonly type: string;
  readonly start: number;
  readonly [key: string]: unknown;
}

/** Reads one file. Throws where it is no TypeScript. */
export function parseFile({ path, text }: TextFile): Syntax {
  const { program, module, comments, errors } = parseSync(path, text);
  if (errors.length > 0) throw new Error(`${path}: ${errors.map(({ message }) => message).join('; ')}`);
  const found = look(program as unknown as Node);
  const entries = module.staticExports.flatMap((statement) => statement.entries);
  const own = entries.filter((entry) => entry.moduleRequest === null);
  const dynamic = module.dynamicImports.map(({ moduleRequest }) => text.slice(moduleRequest.start, moduleRequest.end));
  const computed = dynamic.some((from) => !LITERAL.test(from));
  return {
    path,
    imports: [
      ...module.staticImports.map((statement) => ({
        from: statement.moduleRequest.value,
        names: statement.entries.map(
          ({ importName }) => importName.name ?? (importName.kind === 'Default' ? 'default' : '*'),
        ),
        erased: statement.entries.length > 0 && statement.entries.every(({ isType }) => isType),
      })),
      ...dynamic
        .filter((from) => LITERAL.test(from))
        .map((from) => ({ from: from.slice(1, -1), names: ['*'], erased: false })),
      ...found.typeImports.map((from) => ({ from, names: ['*'], erased: true })),
    ],
    reexports: entries.flatMap((entry) =>
      entry.moduleRequest === null
        ? []
        : [
            {
              from: entry.moduleRequest.value,
              names: [entry.importName.name ?? '*'],
              as: [entry.exportName.name ?? '*'],
              erased: entry.isType,
            },
          ],
    ),
    exports: own.map((entry) => entry.exportName.name ?? 'default'),
    mentionedTypes: own
      .filter((entry) => entry.isType && found.mentioned.has(entry.localName.name ?? ''))
      .map((entry) => entry.exportName.name ?? ''),
    globals: new Set([...found.globals, ...(computed ? ['import(…)'] : [])]),
    raisesPowers: found.raisesPowers,
    onlyReexports: program.body.every(
      (node) => /^Export(All|Named)Declaration$/.test(node.type) && 'source' in node && node.source,
    ),
    hasHeader: comments.some(({ start }) => start < (program.body[0]?.start ?? Number.POSITIVE_INFINITY)),
  };
}

/** An import's source that is a plain string. */
const LITERAL = /^(['"`])[^$]*\1$/;

interface Found {
  /** Every name that is used, wherever it is declared. */
  readonly mentioned: ReadonlySet<string>;
  readonly globals: ReadonlySet<string>;
  readonly typeImports: readonly string[];
  readonly raisesPowers: boolean;
}

/** Keys under which an identifier is a label and no reference, by the type of the node that holds it. */
const LABELS: Readonly<Record<string, readonly string[]>> = {
  MemberExpression: ['property'],
  Property: ['key'],
  MethodDefinition: ['key'],
  PropertyDefinition: ['key'],
  TSPropertySignature: ['key'],
  TSMethodSignature: ['key'],
  TSQualifiedName: ['right'],
  TSNamedTupleMember: ['label'],
  TSTypePredicate: ['parameterName'],
  ImportSpecifier: ['imported'],
  ExportSpecifier: ['exported', 'local'],
  MetaProperty: ['meta', 'property'],
  LabeledStatement: ['label'],
  BreakStatement: ['label'],
  ContinueStatement: ['label'],
};

/** Keys under which an identifier declares a name. */
const DECLARING = new Set(['id', 'local', 'params', 'param', 'parameters', 'name']);

function look(program: Node): Found {
  const used = new Set<string>();
  const declared = new Set<string>();
  const typeImports: string[] = [];
  let raisesPowers = false;
  const visit = (node: Node, parent: Node | undefined, key: string, declaring: boolean): void => {
    if (node.type === 'Identifier' && !isLabel(parent, key)) (declaring ? declared : used).add(String(node.name));
    if (node.type === 'Identifier' && node.name === 'Math' && parent?.type !== 'MemberExpression')
      used.add('Math itself');
    if (node.type === 'MetaProperty') used.add('import.meta');
    if (node.type === 'MemberExpression') used.add(mathName(node));
    if (node.type === 'TSImportType') typeImports.push(literal(node.source ?? node.argument));
    if (node.operator === '**' || node.operator === '**=') raisesPowers = true;
    for (const [name, value] of Object.entries(node)) {
      const inside = declares(node, name, declaring);
      for (const child of Array.isArray(value) ? value : [value]) if (isNode(child)) visit(child, node, name, inside);
    }
  };
  visit(program, undefined, '', false);
  used.delete('');
  const globals = new Set([...used].filter((name) => !declared.has(name)));
  return { mentioned: used, globals, typeImports, raisesPowers };
}

/** Whether identifiers directly under `key` of `node` declare names; patterns hand the answer down. */
function declares(node: Node, key: string, declaring: boolean): boolean {
  if (/Pattern$|^RestElement$|^TSParameterProperty$/.test(node.type))
    return declaring && key !== 'right' && key !== 'key';
  if (node.type === 'Property') return declaring && key === 'value';
  if (key === 'typeAnnotation' || key === 'init' || key === 'body') return false;
  return DECLARING.has(key) && node.type !== 'TSTypeReference';
}

function isLabel(parent: Node | undefined, key: string): boolean {
  return parent !== undefined && parent.computed !== true && (LABELS[parent.type]?.includes(key) ?? false);
}

/** `Math.exp` of such a member expression; `Math[…]` where the name is computed; else nothing. */
function mathName(node: Node): string {
  const { object, property, computed } = node;
  if (!isNode(object) || object.type !== 'Identifier' || object.name !== 'Math' || !isNode(property)) return '';
  return computed === true ? 'Math[…]' : `Math.${String(property.name)}`;
}

function literal(value: unknown): string {
  const node = isNode(value) && isNode(value.literal) ? value.literal : value;
  return isNode(node) ? String(node.value) : '';
}

function isNode(value: unknown): value is Node {
  return typeof value === 'object' && value !== null && 'type' in value && typeof value.type === 'string';
}
