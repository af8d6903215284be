/** Stands in for `astro:actions`, which only Astro's own build knows: a test says on the context which form was sent. */
export interface SentForm {
  readonly action?: { readonly calledFrom: 'form' | 'rpc'; readonly name: string; handler(): Promise<unknown> };
}

const sent = new WeakMap<object, SentForm>();
const results = new WeakMap<object, { name: string; result: unknown }>();

export function sendForm(context: object, form: SentForm): void {
  sent.set(context, form);
}

/** The answer with which a page is drawn again. */
export function resultOf(context: object): { name: string; result: unknown } | undefined {
  return results.get(context);
}

export function getActionContext(context: object): SentForm & { setActionResult(name: string, result: unknown): void; serializeActionResult(result: unknown): unknown } {
  return {
    ...sent.get(context),
    setActionResult: (name, result) => { results.set(context, { name, result }); },
    serializeActionResult: (result) => result,
  };
}
