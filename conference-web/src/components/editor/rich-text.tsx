import { Fragment, type ReactNode } from 'react';
import { safeHref } from './safe-link';
import styles from './rich-text.module.css';

interface Node {
  type: unknown;
  attrs?: unknown;
  content?: unknown;
  marks?: unknown;
  text?: unknown;
}

// as deep as the server lets a remark be; what is deeper was not made by the editor
const DEEPEST = 20;

const isObject = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null && !Array.isArray(value);
const attribute = (of: { attrs?: unknown }, name: string): unknown => (isObject(of.attrs) && Object.hasOwn(of.attrs, name) ? of.attrs[name] : undefined);

function children(node: Node, depth: number): ReactNode {
  if (!Array.isArray(node.content) || depth >= DEEPEST) return null;
  return node.content.map((child, index) => <Fragment key={index}>{drawNode(child, depth + 1)}</Fragment>);
}

function drawNode(value: unknown, depth: number): ReactNode {
  if (!isObject(value)) return null;
  const node = value as unknown as Node;
  switch (node.type) {
    case 'text':
      return typeof node.text === 'string' ? drawMarks(node.text, node.marks) : null;
    case 'paragraph':
      return <p>{children(node, depth)}</p>;
    // a remark stands under a section of the page, so its headings are no part of the page's outline
    case 'heading':
      return <p className={styles.heading}>{children(node, depth)}</p>;
    case 'bulletList':
      return <ul>{children(node, depth)}</ul>;
    case 'orderedList':
      return <OrderedList start={attribute(node, 'start')} type={attribute(node, 'type')}>{children(node, depth)}</OrderedList>;
    case 'listItem':
      return <li>{children(node, depth)}</li>;
    case 'blockquote':
      return <blockquote>{children(node, depth)}</blockquote>;
    case 'codeBlock':
      return (
        <pre>
          <code>{children(node, depth)}</code>
        </pre>
      );
    case 'horizontalRule':
      return <hr />;
    case 'hardBreak':
      return <br />;
    case 'mention':
      return <Mention label={attribute(node, 'label')} />;
    default:
      // a part of another version of the editor, or none of its own: what it says is kept, what it is is not
      return (
        <>
          {typeof node.text === 'string' ? node.text : null}
          {children(node, depth)}
        </>
      );
  }
}

const LIST_TYPES = ['1', 'a', 'A', 'i', 'I'] as const;

function OrderedList({ start, type, children }: { start: unknown; type: unknown; children: ReactNode }) {
  const first = Number.isInteger(start) && (start as number) > 1 && (start as number) < 10_000 ? (start as number) : undefined;
  return (
    <ol start={first} type={LIST_TYPES.find((known) => known === type)}>
      {children}
    </ol>
  );
}

const Mention = ({ label }: { label: unknown }) => (
  <span className={styles.mention}>@{typeof label === 'string' && label ? label : 'someone'}</span>
);

function drawMarks(text: string, marks: unknown): ReactNode {
  if (!Array.isArray(marks)) return text;
  return marks.filter(isObject).reduceRight<ReactNode>((inside, mark) => drawMark(inside, mark), text);
}

function drawMark(inside: ReactNode, mark: Record<string, unknown>): ReactNode {
  switch (mark['type']) {
    case 'bold':
      return <strong>{inside}</strong>;
    case 'italic':
      return <em>{inside}</em>;
    case 'underline':
      return <u>{inside}</u>;
    case 'strike':
      return <s>{inside}</s>;
    case 'code':
      return <code>{inside}</code>;
    case 'link': {
      const href = safeHref(attribute(mark, 'href'));
      if (!href) return inside;
      return (
        <a href={href} target="_blank" rel="noopener noreferrer nofollow">
          {inside}
        </a>
      );
    }
    default:
      return inside;
  }
}

/**
 * What somebody wrote, drawn from the editor's JSON by a list of known parts, without the editor and without HTML:
 * nothing in it can become more than text, lists, quotes and links that lead to http, https or mailto.
 */
export function RichText({ content }: { content: unknown }) {
  return <div className={styles.text}>{drawNode(content, 0)}</div>;
}
