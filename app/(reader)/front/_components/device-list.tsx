import { DrawList } from '@/components/catalogue/draw-list';
import { PageTitle, Section } from '@/components/layout/headings';
import { Sheet } from '@/components/layout/sheet';
import { loadCategories, loadDevices } from '@/lib/catalogue/loaders';
import { loadTypicalDraws } from '@/lib/figures/loaders';

/** Every device, by category: what one axis can compare stands together. */
export async function DeviceList() {
  const [categories, devices] = await Promise.all([loadCategories(), loadDevices()]);
  const draws = await loadTypicalDraws(devices.map((device) => device.id));
  return (
    <Sheet head={<PageTitle lead="With the typical draw of each, on its category’s basis.">Devices</PageTitle>}>
      {categories.map((category) => {
        const own = devices.filter((device) => device.category.id === category.id);
        if (own.length === 0) return null;
        return (
          <Section
            key={category.slug}
            title={category.name}
            aside={<span className="text-muted">{category.basis.label}</span>}
          >
            <DrawList hits={own.map((device) => ({ device, figure: draws.get(device.id) ?? null }))} />
          </Section>
        );
      })}
    </Sheet>
  );
}
