import { readFileSync, readdirSync } from 'node:fs';
import { join, relative } from 'node:path';
import ts from 'typescript';

/** One call of the client: where it goes, and what it takes the body and the answer for. `{}` is a part that is filled in. */
export interface ClientCall {
  file: string;
  method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  paths: string[];
  body: Shape | null;
  answer: Shape | null;
}
/** a contract by its name, or the keys of a shape that has none */
export type Shape = string | string[];

const FRONTEND = join(__dirname, '../../../frontend/src');
const methods: Record<string, ClientCall['method']> = { get: 'get', post: 'post', postPublic: 'post', put: 'put', patch: 'patch', delete: 'delete', upload: 'post' };
/** anything that the text does not tell */
const OPEN = '{}';

/** Every call of `api` in the client's features, by the text of the program alone. */
export function clientCalls(): ClientCall[] {
  return readdirSync(join(FRONTEND, 'features'), { recursive: true, encoding: 'utf8' }).filter((name) => /\/api\/[^/]*(?<!\.spec)\.ts$/.test(name)).sort().flatMap((name) => {
    const path = join(FRONTEND, 'features', name);
    const source = ts.createSourceFile(path, readFileSync(path, 'utf8'), ts.ScriptTarget.Latest, true);
    return callsIn(source).map((call) => ({ file: relative(FRONTEND, path), ...call }));
  });
}

function callsIn(source: ts.SourceFile): Omit<ClientCall, 'file'>[] {
  const found: Omit<ClientCall, 'file'>[] = [];
  const visit = (node: ts.Node): void => {
    const name = apiMethod(node);
    if (name && ts.isCallExpression(node)) found.push(described(source, node, name));
    ts.forEachChild(node, visit);
  };
  visit(source);
  return found;
}
function apiMethod(node: ts.Node): string | null {
  if (!ts.isCallExpression(node) || !ts.isPropertyAccessExpression(node.expression)) return null;
  return node.expression.expression.getText() === 'api' && node.expression.name.text in methods ? node.expression.name.text : null;
}

function described(source: ts.SourceFile, call: ts.CallExpression, name: string): Omit<ClientCall, 'file'> {
  const [path, second] = call.arguments;
  const wrapper = wrapperOf(call);
  const fourth = call.arguments[3];
  const method = name === 'upload' && fourth && ts.isStringLiteral(fourth) ? (fourth.text.toLowerCase() as ClientCall['method']) : methods[name]!;
  const sends = second && name !== 'get' && name !== 'upload';
  return {
    method,
    paths: [...new Set(textsOf(source, path!, new Map()))].map((one) => one.replace(/\?.*$/, '')),
    body: sends ? shapeOf(source, bodyType(call, second, wrapper)) : null,
    answer: shapeOf(source, call.typeArguments?.[0] ?? wrapper?.typeArguments?.[1]),
  };
}
/** useThing<Body, Answer>(…, (body) => api.post(…)) says the types for the call within */
function wrapperOf(call: ts.CallExpression): ts.CallExpression | undefined {
  for (let node: ts.Node = call.parent; !ts.isSourceFile(node); node = node.parent) if (ts.isCallExpression(node)) return node;
  return undefined;
}
function bodyType(call: ts.Node, body: ts.Expression, wrapper: ts.CallExpression | undefined): ts.TypeNode | undefined {
  if (!ts.isIdentifier(body)) return undefined;
  for (let node: ts.Node = call.parent; !ts.isSourceFile(node); node = node.parent) {
    if (!ts.isArrowFunction(node)) continue;
    const given = node.parameters.find((one) => one.name.getText() === body.text);
    if (given) return given.type ?? wrapper?.typeArguments?.[0];
  }
  return undefined;
}

function shapeOf(source: ts.SourceFile, type: ts.TypeNode | undefined): Shape | null {
  if (!type || type.kind === ts.SyntaxKind.VoidKeyword) return null;
  if (ts.isTypeLiteralNode(type)) return type.members.map((one) => one.name?.getText() ?? '');
  const local = source.statements.find((one): one is ts.InterfaceDeclaration => ts.isInterfaceDeclaration(one) && one.name.text === type.getText());
  const open = source.statements.some((one) => ts.isFunctionDeclaration(one) && one.typeParameters?.some((given) => given.name.text === type.getText()));
  if (open) return null;
  return local ? local.members.map((one) => one.name?.getText() ?? '') : type.getText();
}

/** What an expression may come to, names of ids left open. */
function textsOf(source: ts.SourceFile, node: ts.Expression, known: Map<string, string[]>): string[] {
  if (ts.isParenthesizedExpression(node)) return textsOf(source, node.expression, known);
  if (ts.isStringLiteralLike(node)) return [node.text];
  if (ts.isConditionalExpression(node)) return [...textsOf(source, node.whenTrue, known), ...textsOf(source, node.whenFalse, known)];
  if (ts.isTemplateExpression(node)) {
    return node.templateSpans.reduce((heads, span) => each(heads, textsOf(source, span.expression, known), (a, b) => a + b + span.literal.text), [node.head.text]);
  }
  if (ts.isIdentifier(node)) return known.get(node.text) ?? fromCallers(source, node);
  if (!ts.isCallExpression(node)) return [OPEN];
  if (ts.isPropertyAccessExpression(node.expression) && node.expression.name.text === 'join' && ts.isArrayLiteralExpression(node.expression.expression)) {
    const parts = node.expression.expression.elements.map((part) => textsOf(source, ts.isSpreadElement(part) ? part.expression : part, known));
    return parts.reduce((heads, part) => each(heads, part, (a, b) => (b ? `${a}/${b}` : a)));
  }
  const called = arrowNamed(source, node.expression.getText());
  return called ? textsOf(source, called.body as ts.Expression, given(source, called, node, known)) : [OPEN];
}
const each = (heads: string[], tails: string[], put: (a: string, b: string) => string): string[] => heads.flatMap((a) => tails.map((b) => put(a, b)));

function given(source: ts.SourceFile, called: ts.ArrowFunction, call: ts.CallExpression, known: Map<string, string[]>): Map<string, string[]> {
  return new Map(called.parameters.map((one, at): [string, string[]] => {
    const values = call.arguments.slice(at).map((argument) => textsOf(source, argument, known));
    if (one.dotDotDotToken) return [one.name.getText(), values.length ? values.reduce((heads, part) => each(heads, part, (a, b) => `${a}/${b}`)) : ['']];
    return [one.name.getText(), values[0] ?? [OPEN]];
  }));
}
function arrowNamed(source: ts.SourceFile, name: string): ts.ArrowFunction | undefined {
  for (const statement of source.statements) {
    if (!ts.isVariableStatement(statement)) continue;
    for (const one of statement.declarationList.declarations) if (one.name.getText() === name && one.initializer && ts.isArrowFunction(one.initializer)) return one.initializer;
  }
  return undefined;
}
/** a path handed to a function of the file: what its callers hand */
function fromCallers(source: ts.SourceFile, { text, parent }: ts.Identifier): string[] {
  if (!ts.isCallExpression(parent) || !apiMethod(parent)) return [OPEN];
  const owner = source.statements.find((one): one is ts.FunctionDeclaration => ts.isFunctionDeclaration(one) && one.pos <= parent.pos && parent.end <= one.end);
  const at = owner?.parameters.findIndex((one) => one.name.getText() === text) ?? -1;
  if (!owner || at < 0) return [OPEN];
  const texts: string[] = [];
  const visit = (node: ts.Node): void => {
    const handed = ts.isCallExpression(node) && node.expression.getText() === owner.name?.text ? node.arguments[at] : undefined;
    if (handed) texts.push(...textsOf(source, handed, new Map()));
    ts.forEachChild(node, visit);
  };
  visit(source);
  return texts;
}
