import { useEffect } from 'react';

interface FormCareProps {
  formId: string;
}

/**
 * Looks after a form that the page draws: warns before leaving with something typed and not saved, also when another
 * form of the page is sent; and chooses the way (`.rule`) whose field is typed into.
 */
export function FormCare({ formId }: FormCareProps) {
  useEffect(() => {
    const form = document.getElementById(formId);
    if (!(form instanceof HTMLFormElement)) return;
    let typed = false;
    let isSent = false;
    const onInput = (event: Event) => {
      typed = true;
      const radio = event.target instanceof Element && !event.target.matches('[type="radio"]') ? event.target.closest('.rule')?.querySelector<HTMLInputElement>('[type="radio"]') : null;
      if (radio) radio.checked = true;
    };
    const onSubmit = () => { isSent = true; };
    const onLeave = (event: BeforeUnloadEvent) => { if (typed && !isSent) event.preventDefault(); };
    form.addEventListener('input', onInput);
    form.addEventListener('submit', onSubmit);
    window.addEventListener('beforeunload', onLeave);
    return () => {
      form.removeEventListener('input', onInput);
      form.removeEventListener('submit', onSubmit);
      window.removeEventListener('beforeunload', onLeave);
    };
  }, [formId]);
  return null;
}
