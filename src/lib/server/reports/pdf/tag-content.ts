import { createRequire } from 'node:module';

interface Element {
	add(child: Element): void;
}

/** What of the PDF writer's drawing is asked for here; it ships no types for it. */
interface TaggedDocument {
	page: unknown;
	markStructureContent(tag: string): unknown;
	markContent(tag: 'Artifact', options: { type: string }): void;
	endMarkedContent(): void;
	struct(tag: string, options?: { alt?: string }, children?: unknown[]): Element;
	addStructure(element: Element): void;
}

interface DrawnLine {
	getHeight(): number;
}

interface Drawing {
	pdfDocument: TaggedDocument;
	renderPages(pages: unknown): void;
	renderLine(line: DrawnLine, x: number, y: number): void;
	renderVector(vector: unknown): void;
	renderImage(image: unknown): void;
	renderSVG(svg: { _height?: number }): void;
}

/** Lines that follow one another in one column: one paragraph. */
interface Paragraph {
	page: unknown;
	x: number;
	nextY: number;
	content: unknown[];
}

/** Drawings lower than this are marks beside their words, which say the same. */
const chartHeightPoints = 60;
const pictureText = 'Photograph, described beside it';
const chartText = 'Chart of temperature and life; its figures stand in the tables beside it';

const open = new WeakMap<TaggedDocument, Paragraph>();
const roots = new WeakMap<TaggedDocument, Element>();

/** One element holds all others: readers expect a document at the root. */
function addTo(document: TaggedDocument, element: Element): void {
	const root = roots.get(document) ?? document.struct('Document');
	if (!roots.has(document)) document.addStructure(root);
	roots.set(document, root);
	root.add(element);
}

function closeParagraph(document: TaggedDocument): void {
	const paragraph = open.get(document);
	if (paragraph) addTo(document, document.struct('P', {}, paragraph.content));
	open.delete(document);
}

/** A line goes on with the paragraph where it stands right below it, within half a line. */
function goesOn(paragraph: Paragraph | undefined, page: unknown, x: number, y: number, height: number) {
	const isSameColumn = paragraph?.page === page && paragraph?.x === x;
	return isSameColumn && y >= paragraph.nextY - 1 && y <= paragraph.nextY + height / 2;
}

function asArtifact(document: TaggedDocument, draw: () => void): void {
	document.markContent('Artifact', { type: 'Layout' });
	draw();
	document.endMarkedContent();
}

function asFigure(document: TaggedDocument, alt: string, draw: () => void): void {
	closeParagraph(document);
	const content = document.markStructureContent('Figure');
	draw();
	document.endMarkedContent();
	addTo(document, document.struct('Figure', { alt }, [content]));
}

function tagging(plain: Drawing): Partial<Drawing> {
	const { renderPages, renderLine, renderVector, renderImage, renderSVG } = plain;
	return {
		renderPages(this: Drawing, pages) {
			renderPages.call(this, pages);
			closeParagraph(this.pdfDocument);
		},
		renderLine(this: Drawing, line, x, y) {
			const document = this.pdfDocument;
			const height = line.getHeight();
			if (!goesOn(open.get(document), document.page, x, y, height)) closeParagraph(document);
			const paragraph = open.get(document) ?? { page: document.page, x, nextY: y, content: [] };
			paragraph.content.push(document.markStructureContent('P'));
			renderLine.call(this, line, x, y);
			document.endMarkedContent();
			open.set(document, { ...paragraph, nextY: y + height });
		},
		renderVector(this: Drawing, vector) {
			asArtifact(this.pdfDocument, () => renderVector.call(this, vector));
		},
		renderImage(this: Drawing, image) {
			asFigure(this.pdfDocument, pictureText, () => renderImage.call(this, image));
		},
		renderSVG(this: Drawing, svg) {
			const draw = () => renderSVG.call(this, svg);
			if ((svg._height ?? 0) < chartHeightPoints) asArtifact(this.pdfDocument, draw);
			else asFigure(this.pdfDocument, chartText, draw);
		}
	};
}

let isTagging = false;

/**
 * Makes the PDF writer tag what it draws, which it does not by itself: words as paragraphs in reading order, charts and
 * pictures as figures with a text in their place, rules and marks as artifacts. Cells of tables are paragraphs to it.
 */
export function tagContent(): void {
	if (isTagging) return;
	isTagging = true;
	const { default: renderer }: { default: { prototype: Drawing } } = createRequire(import.meta.url)(
		'pdfmake/js/Renderer.js'
	);
	Object.assign(renderer.prototype, tagging(renderer.prototype));
}
