/** The spreadsheet in its place: makes a model from workbook data and mounts it, replacing the one before. */
import { App } from "@odoo/owl";
import { Model, Spreadsheet } from "@odoo/o-spreadsheet";
import { withoutLog10 } from "./dialect";
import { growWith } from "./grow";
import { onSettled } from "./later";

export type WorkbookModel = InstanceType<typeof Model>;

export interface Grid {
  model(): WorkbookModel;
  /** Builds the new workbook first, so that a failure leaves the open one as it is. */
  show(data: unknown, ready?: (model: WorkbookModel) => void): Promise<void>;
  /** Calls back with the model now and with each one after it; what the callback returns ends its hold on a model. */
  follow(callback: (model: WorkbookModel) => () => void): () => void;
}

export function createGrid(host: HTMLElement, templates: string, tell: (text: string) => void): Grid {
  let app: { destroy(): void } | undefined;
  let current: WorkbookModel | undefined;
  const followers = new Map<(model: WorkbookModel) => () => void, () => void>();
  const dark = matchMedia("(prefers-color-scheme: dark)");

  async function mount(model: WorkbookModel): Promise<void> {
    app?.destroy();
    current?.leaveSession();
    host.replaceChildren();
    current = model;
    const next = new App(Spreadsheet, {
      props: {
        model,
        colorScheme: dark.matches ? "dark" : "light",
        notifyUser: (notification: { text: string }) => tell(notification.text),
        raiseError: (text: string, done?: () => void) => (tell(text), done?.()),
        askConfirmation: (text: string, yes: () => void, no?: () => void) => (confirm(text) ? yes() : no?.()),
      },
      translateFn: (text: string) => text,
      warnIfNoStaticProps: false,
    });
    next.addTemplates(templates);
    app = next;
    await next.mount(host);
  }

  dark.addEventListener("change", () => current && void mount(current));
  growWith(() => current);
  onSettled(() => current?.dispatch("EVALUATE_CELLS"));

  return {
    model: () => current!,
    follow(callback) {
      followers.set(callback, current ? callback(current) : () => {});
      return () => {
        followers.get(callback)?.();
        followers.delete(callback);
      };
    },
    async show(data, ready) {
      const model = new Model(data as object);
      readLog10(model);
      ready?.(model);
      await mount(model);
      for (const [callback, stop] of followers) {
        stop();
        followers.set(callback, callback(model));
      }
    },
  };
}

/** The library takes LOG10 for a cell in column LOG; LOG alone means the same, to base 10. */
function readLog10(model: WorkbookModel): void {
  const dispatch = model.dispatch as (type: string, payload?: object) => unknown;
  const understood = (type: string, payload?: { content?: unknown }): unknown => {
    const content = payload?.content;
    if (type !== "UPDATE_CELL" || typeof content !== "string" || !/^[=+].*\bLOG10\s*\(/i.test(content))
      return dispatch(type, payload);
    return dispatch(type, { ...payload, content: withoutLog10(content) });
  };
  model.dispatch = understood as typeof model.dispatch;
}
