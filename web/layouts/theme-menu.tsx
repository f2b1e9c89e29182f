import { MoonStar, Sun, SunMoon } from "lucide-react";
import { Menu, MenuEntry } from "#web/components/menu.tsx";
import { useThemeChoice, type ThemeChoice } from "#web/lib/theme.ts";

const choices: { choice: ThemeChoice; name: string; Icon: typeof Sun }[] = [
  { choice: "system", name: "As the device", Icon: SunMoon },
  { choice: "light", name: "Day", Icon: Sun },
  { choice: "dark", name: "Night shift", Icon: MoonStar },
];

/** Day, night shift, or as the device says. */
export function ThemeMenu({ onFloor }: { onFloor: boolean }) {
  const [choice, choose] = useThemeChoice(onFloor);
  const Present = choices.find((entry) => entry.choice === choice)?.Icon ?? SunMoon;
  return (
    <Menu
      name="Light and dark"
      label={
        <>
          <Present aria-hidden="true" className="size-5" strokeWidth={1.75} />
          <span className="grow text-left font-condensed text-lg font-semibold md:hidden">
            Light and dark
          </span>
        </>
      }
      className="border-rule hover:bg-wash max-md:min-h-12 max-md:px-4 md:border-l"
    >
      {choices.map(({ choice: entry, name, Icon }) => (
        <MenuEntry key={entry}>
          <button
            type="button"
            aria-pressed={entry === choice}
            onClick={() => {
              choose(entry);
            }}
            className="aria-pressed:font-semibold aria-pressed:shadow-[inset_4px_0_0_var(--dye)]"
          >
            <Icon aria-hidden="true" className="size-5" strokeWidth={1.75} />
            {name}
          </button>
        </MenuEntry>
      ))}
    </Menu>
  );
}
