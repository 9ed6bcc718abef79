import ts from 'typescript';

/** One broken rule: `lib/domain/x.ts:12 reads the clock`. */
export interface Violation {
  at: string;
  broken: string;
}

const LONGEST_FILE_LINES = 250;
const LONGEST_FUNCTION_LINES = 60;
/** Markup takes a line an attribute, so a component may be longer. */
const LONGEST_COMPONENT_LINES = 100;

interface Rule {
  applies(file: string): boolean;
  /** What a node of the syntax tree breaks, or nothing. */
  broken(node: ts.Node, source: ts.SourceFile): string | undefined;
}

const isCode = (file: string) => !file.startsWith('tests/') && !/(^|\/)[\w.-]+\.config\.\w+$/.test(file);

const accessOf = (node: ts.Node, object: string, property: string) =>
  (ts.isPropertyAccessExpression(node) &&
    node.expression.getText() === object &&
    node.name.text === property) ||
  (ts.isElementAccessExpression(node) &&
    node.expression.getText() === object &&
    ts.isStringLiteralLike(node.argumentExpression) &&
    node.argumentExpression.text === property);

const isBareDate = (node: ts.Node) =>
  (ts.isNewExpression(node) || ts.isCallExpression(node)) &&
  node.expression.getText() === 'Date' &&
  (ts.isCallExpression(node) || (node.arguments ?? []).length === 0);

/** The pure core, and queries, take `now` and `today` as arguments. */
const clock: Rule = {
  applies: (file) => file.startsWith('lib/domain/') || file.startsWith('db/queries/'),
  broken: (node) => {
    if (isBareDate(node) || accessOf(node, 'Date', 'now')) return 'reads the clock';
    if (accessOf(node, 'performance', 'now')) return 'reads the clock';
    if (accessOf(node, 'Math', 'random')) return 'rolls dice';
    return undefined;
  },
};

/**
 * `lib/env.ts` reads the environment; the launcher hands it on to its children; configurations run before both. What
 * `instrumentation.ts` names is replaced when it is compiled: for which runtime.
 */
const environment: Rule = {
  applies: (file) =>
    isCode(file) && !['lib/env.ts', 'instrumentation.ts'].includes(file) && !file.startsWith('lib/launch/'),
  broken: (node) => {
    const imported = ts.isImportDeclaration(node) && /^(node:)?process$/.test(textOf(node.moduleSpecifier));
    const taken =
      ts.isVariableDeclaration(node) &&
      ts.isObjectBindingPattern(node.name) &&
      node.initializer?.getText() === 'process';
    return imported || taken || accessOf(node, 'process', 'env') ? 'reads the environment' : undefined;
  },
};

const jobs: Rule = {
  applies: (file) => isCode(file) && file !== 'lib/enqueue.ts' && !file.startsWith('migrations/'),
  broken: (node) => {
    const literal =
      ts.isStringLiteralLike(node) ||
      ts.isTemplateHead(node) ||
      ts.isTemplateMiddle(node) ||
      ts.isTemplateTail(node);
    return literal && /\badd_jobs?\b/.test(node.text) ? 'enqueues a job past lib/enqueue.ts' : undefined;
  },
};

const length: Rule = {
  applies: (file) => isCode(file) && !file.startsWith('migrations/'),
  broken: (node, source) => {
    if (ts.isSourceFile(node)) {
      const lines = lineOf(source, node.getEnd());
      return lines > LONGEST_FILE_LINES ? `has ${lines} lines, above ${LONGEST_FILE_LINES}` : undefined;
    }
    if (!ts.isFunctionLike(node)) return undefined;
    const lines = lineOf(source, node.getEnd()) - lineOf(source, node.getStart(source)) + 1;
    const longest = source.fileName.endsWith('x') ? LONGEST_COMPONENT_LINES : LONGEST_FUNCTION_LINES;
    return lines > longest ? `has a function of ${lines} lines, above ${longest}` : undefined;
  },
};

const suppression = /@ts-(ignore|nocheck|expect-error)|eslint-disable/;

const lineOf = (source: ts.SourceFile, position: number) =>
  source.getLineAndCharacterOfPosition(position).line + 1;
const textOf = (node: ts.Node) => (ts.isStringLiteralLike(node) ? node.text : '');

const RULES = [clock, environment, jobs, length];

/** Every rule that `text`, the content of `file` (a path from the project's root), breaks. */
export function checkSource(file: string, text: string): Violation[] {
  const kind = file.endsWith('x') ? ts.ScriptKind.TSX : ts.ScriptKind.TS;
  const source = ts.createSourceFile(file, text, ts.ScriptTarget.Latest, true, kind);
  const rules = RULES.filter((rule) => rule.applies(file));
  const found: Violation[] = [];
  const visit = (node: ts.Node): void => {
    for (const rule of rules) {
      const broken = rule.broken(node, source);
      if (broken) found.push({ at: `${file}:${lineOf(source, node.getStart(source))}`, broken });
    }
    ts.forEachChild(node, visit);
  };
  visit(source);
  text.split('\n').forEach((line, index) => {
    if (!isCode(file) || !suppression.test(line)) return;
    found.push({ at: `${file}:${index + 1}`, broken: 'silences a checker' });
  });
  return found;
}
