/** One end of a reference. A missing row or column means a whole column or row. Indices start at 0. */
export interface CellPoint {
  readonly row: number | null;
  readonly column: number | null;
  readonly rowFixed: boolean;
  readonly columnFixed: boolean;
}

interface Place {
  /** Position of the first character in the formula text. */
  readonly start: number;
  /** Position after the last character. */
  readonly end: number;
}

export type NumberNode = Place & { readonly kind: "number"; readonly value: number; readonly text: string };
export type TextNode = Place & { readonly kind: "text"; readonly value: string };
export type BooleanNode = Place & { readonly kind: "boolean"; readonly value: boolean };
export type ErrorNode = Place & { readonly kind: "error"; readonly value: string };
export type ReferenceNode = Place & {
  readonly kind: "reference";
  readonly sheet: string | null;
  readonly from: CellPoint;
  /** null for a single cell */
  readonly to: CellPoint | null;
};
/** A reference into another workbook or across several sheets; never followed. */
export type ExternalNode = Place & { readonly kind: "external"; readonly text: string };
export type StructuredNode = Place & {
  readonly kind: "structured";
  /** "" inside the table itself */
  readonly table: string;
  readonly columns: readonly string[];
  readonly section: "data" | "this row" | "headers" | "totals" | "all";
};
export type NameNode = Place & { readonly kind: "name"; readonly name: string };
export type UnaryNode = Place & {
  readonly kind: "unary";
  readonly operator: "neg" | "plus" | "pct" | "single" | "spill";
  readonly argument: Node;
};
export type BinaryNode = Place & {
  readonly kind: "binary";
  readonly operator: string;
  readonly left: Node;
  readonly right: Node;
};
export type CallNode = Place & { readonly kind: "call"; readonly name: string; readonly arguments: readonly Node[] };
export type ArrayNode = Place & { readonly kind: "array"; readonly rows: readonly (readonly Node[])[] };
/** What is not there: an empty argument, or the place of a problem. */
export type MissingNode = Place & { readonly kind: "missing" };

/** A formula as a tree of plain objects. */
export type Node =
  | NumberNode
  | TextNode
  | BooleanNode
  | ErrorNode
  | ReferenceNode
  | ExternalNode
  | StructuredNode
  | NameNode
  | UnaryNode
  | BinaryNode
  | CallNode
  | ArrayNode
  | MissingNode;

export interface Problem {
  readonly start: number;
  readonly end: number;
  readonly message: string;
}

/** The nodes directly inside a node, in reading order. */
export function children(node: Node): readonly Node[] {
  switch (node.kind) {
    case "unary":
      return [node.argument];
    case "binary":
      return [node.left, node.right];
    case "call":
      return node.arguments;
    case "array":
      return node.rows.flat();
    case "number":
    case "text":
    case "boolean":
    case "error":
    case "reference":
    case "external":
    case "structured":
    case "name":
    case "missing":
      return [];
    default:
      return node satisfies never;
  }
}

/** Calls `visit` for the node and everything inside it. */
export function walk(node: Node, visit: (node: Node) => void): void {
  const stack: Node[] = [node];
  for (let next = stack.pop(); next; next = stack.pop()) {
    visit(next);
    const inside = children(next);
    for (let i = inside.length - 1; i >= 0; i--) stack.push(inside[i]!);
  }
}

/** The same node with other nodes directly inside it, given in reading order. */
export function withChildren(node: Node, inside: readonly Node[]): Node {
  if (node.kind === "unary") return { ...node, argument: inside[0]! };
  if (node.kind === "binary") return { ...node, left: inside[0]!, right: inside[1]! };
  if (node.kind === "call") return { ...node, arguments: inside };
  if (node.kind === "array") {
    let next = 0;
    return { ...node, rows: node.rows.map((row) => row.map(() => inside[next++]!)) };
  }
  return node;
}
