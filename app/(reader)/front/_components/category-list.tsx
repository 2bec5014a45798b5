import Link from 'next/link';
import { countWords, medianOf, plainUnit, rangeOf } from '@/components/figures/figure-words';
import { PageTitle } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';
import { loadCategories } from '@/lib/catalogue/loaders';
import { loadFiguresOfCategory } from '@/lib/figures/loaders';

export async function CategoryList() {
  const categories = await loadCategories();
  const figures = await Promise.all(categories.map((category) => loadFiguresOfCategory(category.id)));
  return (
    <Sheet head={<PageTitle lead="Kinds of device, each compared on a basis of its own.">Categories</PageTitle>}>
      <ul className="mt-6 border-t border-rule">
        {categories.map((category, i) => {
          const headline = figures[i]?.find((figure) => figure.isHeadline);
          return (
            <li key={category.slug} className="grid gap-x-8 border-b border-rule py-4 sm:grid-cols-[1fr_auto]">
              <div className="max-w-prose">
                <Link
                  href={`/categories/${category.slug}`}
                  className="font-semibold text-lichen underline underline-offset-4"
                >
                  {category.name}
                </Link>
                <p className="text-note">{category.summary}</p>
              </div>
              <p className="font-mono sm:text-right">
                {headline ? (
                  <>
                    {medianOf(headline).value} {plainUnit(medianOf(headline).unit)}
                    <span className="block text-cell text-muted">
                      {category.basis.label}, {countWords(headline.n, 'device')}, {rangeOf(headline)}
                    </span>
                  </>
                ) : (
                  <span className="text-muted">not measured</span>
                )}
              </p>
            </li>
          );
        })}
      </ul>
    </Sheet>
  );
}
