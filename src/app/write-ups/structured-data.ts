import type { EditionView, FixView, WriteUpPage } from '../../../shared/contract/write-ups';

/** A write-up for machines (schema.org): a technical article about the two products, with one how-to for each fix. */
export function writeUpData(page: WriteUpPage, address: string): object {
  const { view } = page;
  return {
    '@context': 'https://schema.org',
    '@type': 'TechArticle',
    headline: view.title,
    description: view.summary,
    url: address,
    version: String(page.edition.number),
    datePublished: page.firstPublishedAt,
    dateModified: page.edition.publishedAt,
    author: page.authors.map((author) => ({ '@type': 'Person', name: author.displayName })),
    about: productsOf(view),
    keywords: view.symptoms.map((symptom) => symptom.label).join(', '),
    hasPart: view.fixes.map((fix) => howTo(fix, address)),
  };
}

function productsOf(view: EditionView): object[] {
  const parts = view.joints.flatMap((joint) => [joint.a.part, joint.b.part]);
  const once = parts.filter((part, index) => parts.findIndex((other) => other.id === part.id) === index);
  return once.map((part) => ({
    '@type': 'Product',
    name: part.name,
    manufacturer: { '@type': 'Organization', name: part.maker.name },
  }));
}

function howTo(fix: FixView, address: string): object {
  return {
    '@type': 'HowTo',
    name: fix.title,
    url: `${address}#fix-${fix.key}`,
    tool: fix.tools.map((name) => ({ '@type': 'HowToTool', name })),
    supply: fix.materials.map((name) => ({ '@type': 'HowToSupply', name })),
    step: fix.steps.map((step, index) => ({
      '@type': 'HowToStep',
      position: index + 1,
      text: step.text.source,
    })),
  };
}
