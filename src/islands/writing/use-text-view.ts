import { useEffect, useRef, useState, type RefObject } from 'react';
import type { EditorView } from '@codemirror/view';
import type * as TextViewTools from '#islands/writing/text-view.ts';
import type { TextViewOptions } from '#islands/writing/text-view.ts';

/** The view and what can be done with it; both are loaded after the page. */
export type OpenText = typeof TextViewTools & { readonly view: EditorView };

/**
 * Puts the rich text field in the place of the page's own once its program has arrived. Until then, and where it never
 * arrives, the page's own field with its form is there to write in; what was typed into it goes on.
 */
export function useTextView(box: RefObject<HTMLElement | null>, options: Omit<TextViewOptions, 'text'>, onOpen: (open: OpenText, area: HTMLTextAreaElement) => void): OpenText | null {
  const [open, setOpen] = useState<OpenText | null>(null);
  const given = useRef({ options, onOpen });
  given.current = { options, onOpen };
  useEffect(() => {
    const area = box.current?.querySelector('textarea');
    if (area === null || area === undefined) return;
    let closed = false;
    let view: EditorView | undefined;
    const host = document.createElement('div');
    const label = area.labels[0];
    const toView = () => view?.focus();
    void import('#islands/writing/text-view.ts').then((tools) => {
      if (closed) return;
      const heard: TextViewOptions = {
        ...given.current.options,
        text: area.value,
        onEdit: () => given.current.options.onEdit(),
        onCaretLine: (line) => given.current.options.onCaretLine(line),
        onSave: () => given.current.options.onSave(),
        onPicture: (file, place) => given.current.options.onPicture(file, place),
      };
      const hadFocus = document.activeElement === area;
      const { selectionStart, selectionEnd } = area;
      host.className = 'text-view';
      area.after(host);
      area.hidden = true;
      label?.removeAttribute('for');
      label?.addEventListener('click', toView);
      view = tools.openTextView(host, heard);
      const opened = { ...tools, view };
      if (hadFocus) tools.choose(view, { from: selectionStart, to: selectionEnd });
      given.current.onOpen(opened, area);
      setOpen(opened);
    });
    return () => {
      closed = true;
      view?.destroy();
      host.remove();
      area.hidden = false;
      label?.setAttribute('for', area.id);
      label?.removeEventListener('click', toView);
      setOpen(null);
    };
  }, [box]);
  return open;
}
