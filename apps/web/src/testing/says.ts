/** Finds the innermost element that says this, whatever parts its words are made of. */
export const says =
  (words: string | RegExp) =>
  (_: string, element: Element | null): boolean => {
    const fits = (one: Element): boolean =>
      typeof words === 'string' ? one.textContent === words : words.test(one.textContent);
    return element !== null && fits(element) && ![...element.children].some(fits);
  };
