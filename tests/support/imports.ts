import path from 'node:path';
import ts from 'typescript';

export interface Source {
	file: string;
	/** what it imports: a path from the top of the repository, or a package's name */
	imports: readonly string[];
	/** names that the code uses, such as Date or process.env */
	names: ReadonlySet<string>;
	/** names brought in from each import */
	brought: ReadonlyMap<string, string>;
	/** names handed to .insert(), .update() and .delete() */
	written: readonly string[];
}

const SCRIPT = /<script\b[^>]*>([\s\S]*?)<\/script>/g;
const TEMPLATE_IMPORT = /\bimport\(\s*['"]([^'"]+)['"]\s*\)/g;

function code(file: string, text: string): string {
	if (!file.endsWith('.svelte')) return text;
	const scripts = [...text.matchAll(SCRIPT)].map((found) => found[1] ?? '');
	const template = text.replace(SCRIPT, '');
	const lazy = [...template.matchAll(TEMPLATE_IMPORT)].map((found) => `import('${found[1]}');`);
	return [...scripts, ...lazy].join('\n;\n');
}

function resolve(file: string, specifier: string): string {
	const whole = specifier.replace(/^\$lib(?=\/|$)/, 'src/lib');
	const at = whole.startsWith('.') ? path.posix.join(path.posix.dirname(file), whole) : whole;
	if (!at.startsWith('src/')) return at;
	return at.replace(/\.(ts|js)$/, '').replace(/\/index$/, '');
}

function specifierOf(node: ts.Node): string | undefined {
	if (ts.isImportDeclaration(node) || ts.isExportDeclaration(node)) {
		const from = node.moduleSpecifier;
		return from && ts.isStringLiteral(from) ? from.text : undefined;
	}
	if (ts.isCallExpression(node)) {
		const isImport = node.expression.kind === ts.SyntaxKind.ImportKeyword;
		const isRequire = ts.isIdentifier(node.expression) && node.expression.text === 'require';
		const first = node.arguments[0];
		return (isImport || isRequire) && first && ts.isStringLiteralLike(first)
			? first.text
			: undefined;
	}
	if (ts.isImportTypeNode(node) && ts.isLiteralTypeNode(node.argument)) {
		const { literal } = node.argument;
		return ts.isStringLiteral(literal) ? literal.text : undefined;
	}
	return undefined;
}

function broughtBy(node: ts.Node): string[] {
	const clause = ts.isImportDeclaration(node) ? node.importClause : undefined;
	const named = clause?.namedBindings;
	if (!named) return clause?.name ? [clause.name.text] : [];
	return ts.isNamespaceImport(named)
		? [named.name.text]
		: named.elements.map((element) => element.name.text);
}

function writtenBy(node: ts.Node): string | undefined {
	if (!ts.isCallExpression(node) || !ts.isPropertyAccessExpression(node.expression))
		return undefined;
	if (!['insert', 'update', 'delete'].includes(node.expression.name.text)) return undefined;
	const first = node.arguments[0];
	if (first && ts.isIdentifier(first)) return first.text;
	const of = first && ts.isPropertyAccessExpression(first) ? first.expression : undefined;
	return of && ts.isIdentifier(of) ? of.text : undefined;
}

function namesOf(node: ts.Node): string[] {
	if (ts.isPropertyAccessExpression(node)) return [node.getText().replace(/[\s?]/g, '')];
	if (ts.isMetaProperty(node)) return [node.getText()];
	if (ts.isElementAccessExpression(node)) {
		const key = node.argumentExpression;
		const of = node.expression.getText();
		return ts.isStringLiteralLike(key) ? [of, `${of}.${key.text}`] : [of];
	}
	// const { env } = process
	if (ts.isVariableDeclaration(node) && node.initializer?.getText() === 'process') {
		return ['process.env'];
	}
	if (!ts.isIdentifier(node)) return [];
	const { parent } = node;
	const isMember = ts.isPropertyAccessExpression(parent) && parent.name === node;
	const isKey = ts.isPropertySignature(parent) || ts.isPropertyAssignment(parent);
	return isMember || (isKey && parent.name === node) ? [] : [node.text];
}

/** What one file brings in, names and writes; scripts of components and lazy imports included. */
export function readSource(file: string, text: string): Source {
	const tree = ts.createSourceFile('code.ts', code(file, text), ts.ScriptTarget.Latest, true);
	const imports: string[] = [];
	const names = new Set<string>();
	const brought = new Map<string, string>();
	const written: string[] = [];
	const visit = (node: ts.Node) => {
		const specifier = specifierOf(node);
		if (specifier) {
			const target = resolve(file, specifier);
			imports.push(target);
			for (const name of broughtBy(node)) brought.set(name, target);
		}
		for (const name of namesOf(node)) names.add(name);
		const table = writtenBy(node);
		if (table) written.push(table);
		ts.forEachChild(node, visit);
	};
	visit(tree);
	return { file, imports, names, brought, written };
}
