// breaks: not-in-the-browser: not by import() either; mathjs only in src/lib/arithmetic.ts
export const later26 = () => import('mathjs')
// breaks: no-literal-text: take the words from shared/messages
export const words = <p>Sign order</p>
// breaks: no-literal-text-in-braces: take the words from shared/messages
export const bracesText = <p>{'Sign order'}</p>
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const attributeText = <p title={'Sign order'} />
// breaks: no-literal-text-in-braces: take the words from shared/messages
export const bracesTemplate = <p>{`Sign ${7}`}</p>
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const attributeTemplate = <p title={`Sign ${7}`} />
// breaks: no-literal-text-in-braces: take the words from shared/messages
export const bracesEither = <p>{words ? 'orders' : 'order'}</p>
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const attributeEither = <p title={words ? 'orders' : 'order'} />
// breaks: no-literal-text-in-braces: take the words from shared/messages
export const bracesMaybe = <p>{words && 'orders'}</p>
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const attributeMaybe = <p title={words && 'orders'} />
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const inLabel = <Part label="Sign order" />
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const inTitle = <Part title="Sign order" />
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const inPlaceholder = <Part placeholder="Sign order" />
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const inAlt = <Part alt="Sign order" />
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const inHint = <Part hint="Sign order" />
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const inHeading = <Part heading="Sign order" />
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const inDescription = <Part description="Sign order" />
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const inCaption = <Part caption="Sign order" />
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const inLegend = <Part legend="Sign order" />
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const inAriaLabel = <Part aria-label="Sign order" />
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const inAriaDescription = <Part aria-description="Sign order" />
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const inAriaRoledescription = <Part aria-roledescription="Sign order" />
// breaks: no-literal-text-in-attributes: take the words from shared/messages
export const inAriaValuetext = <Part aria-valuetext="Sign order" />

export const Part = (_: Record<string, string>) => null
