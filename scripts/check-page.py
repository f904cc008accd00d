#!/usr/bin/env python3
"""Opens what `irrepwise report` writes in headless Chromium, and uses it as a reader would.

    check-page.py PROGRAM INPUT...

For each input (a molecule, or a job with variants): the page has the same bytes with one thread and
two, stays below 3 MB, loads without an error on the console and without a request that leaves the
file; a click on a level and the arrow keys change what the panel says and shows; a column sorts; the
view turns; every table stands in the printed version; nothing is wider than a phone; dark mode is
dark. Exits with 77 (skipped) where chromium, its driver or python3-selenium is not installed.
"""
import json
import os
import re
import shutil
import subprocess
import sys

from checking import check_each, expect

try:
    from selenium import webdriver
    from selenium.webdriver.chrome.service import Service
    from selenium.webdriver.common.by import By
    from selenium.webdriver.common.keys import Keys
except ImportError:
    print("skipped: python3-selenium is not installed")
    sys.exit(77)

SKIPPED = 77
LARGEST_PAGE = 3_000_000  # bytes
# CSS pixels; 320 is the width without scrolling sideways of WCAG 2.1, 1.4.10.
PHONE, DESK, PAPER = (320, 844), (1280, 900), (680, 1000)


def report(program, job, output, *options):
    done = subprocess.run([program, "report", job, "--output", output, *options],
                          capture_output=True, text=True)
    expect(done.returncode == 0, f"exit code {done.returncode}: {done.stderr}")
    with open(output, "rb") as file:
        return file.read()


def browser():
    options = webdriver.ChromeOptions()
    options.binary_location = shutil.which("chromium")
    for argument in ("--headless=new", "--no-sandbox", "--disable-gpu", "--disable-dev-shm-usage",
                     "--hide-scrollbars", f"--window-size={DESK[0]},{DESK[1]}"):
        options.add_argument(argument)
    options.set_capability("goog:loggingPrefs", {"browser": "ALL", "performance": "ALL"})
    return webdriver.Chrome(options=options, service=Service(shutil.which("chromedriver")))


def set_size(driver, size):
    driver.execute_cdp_cmd("Emulation.setDeviceMetricsOverride", {
        "width": size[0], "height": size[1], "deviceScaleFactor": 1, "mobile": size == PHONE})


def settle(driver):
    """Waits for the view, which paints its fine version a moment after it comes to rest."""
    driver.execute_async_script("setTimeout(arguments[0], 350)")


def panel(driver):
    return driver.find_element(By.CLASS_NAME, "panel").text


def picture(driver):
    return driver.execute_script("return document.getElementById('view').toDataURL()")


def colours_of_phases(driver):
    """How many pixels of the view are rather blue, and rather amber."""
    return driver.execute_script("""
        const canvas = document.getElementById('view');
        const {data} = canvas.getContext('2d').getImageData(0, 0, canvas.width, canvas.height);
        let blue = 0, amber = 0;
        for (let i = 0; i < data.length; i += 4) {
          if (data[i + 3] < 200) continue;
          if (data[i + 2] > data[i] + 60) ++blue;
          if (data[i] > data[i + 2] + 60) ++amber;
        }
        return [blue, amber];""")


def check_loading(driver, page):
    driver.get("file://" + page)
    expect(driver.execute_script("return document.documentElement.dataset.ready") == "true",
           "the script of the page did not come to its end")
    settle(driver)
    log = driver.get_log("browser")
    expect(not log, f"the console says: {log}")
    for entry in driver.get_log("performance"):
        message = json.loads(entry["message"])["message"]
        if message["method"] == "Network.requestWillBeSent":
            url = message["params"]["request"]["url"]
            expect(url.startswith(("file://" + page, "data:", "blob:")), f"a request went to {url}")


def check_structure(driver):
    twice = driver.execute_script("""
        const ids = [...document.querySelectorAll('[id]')].map(e => e.id);
        return ids.filter((id, i) => ids.indexOf(id) !== i);""")
    expect(not twice, f"ids used twice: {twice}")
    dangling = driver.execute_script("""
        return [...document.querySelectorAll('[aria-labelledby], a[href^="#"]')]
          .flatMap(e => (e.getAttribute('aria-labelledby') ?? e.getAttribute('href').slice(1)).split(' '))
          .filter(id => !document.getElementById(id));""")
    expect(not dangling, f"names of nothing: {dangling}")


def energy_words(driver):
    found = re.search("([\u2212-]?[0-9]+\\.[0-9]{3}) eV", panel(driver))
    expect(found, "the panel gives no energy")
    return float(found.group(1).replace("\u2212", "-"))


def check_levels(driver):
    levels = driver.find_elements(By.CSS_SELECTOR, ".diagram g.level")
    expect(len(levels) > 2, "no levels to choose")
    expect(sum(level.get_attribute("aria-pressed") == "true" for level in levels) == 1,
           "one level is chosen from the start")
    start = panel(driver)
    expect("HOMO" in start, "the page does not begin with the HOMO")
    blue, amber = colours_of_phases(driver)
    expect(blue > 500 and amber > 500, f"the HOMO shows {blue} blue and {amber} amber pixels")

    # Every level of the diagram can be chosen, and says its own energy.
    energies = driver.execute_script("""
        return [...document.querySelectorAll('.diagram g.level')].map(g => {
          g.dispatchEvent(new MouseEvent('click', {bubbles: true}));
          return [g.querySelector('title').textContent, document.querySelector('.panel').innerText];
        });""")
    for title, words in energies:
        stated = re.search("([\u2212-]?[0-9]+\\.[0-9]+)\\s*eV", title).group(1).replace("\u2212", "-")
        shown = re.search("([\u2212-]?[0-9]+\\.[0-9]{3}) eV", words).group(1).replace("\u2212", "-")
        expect(abs(float(stated) - float(shown)) < 0.006, f"{title}: the panel says {shown} eV")
    expect(len({words for _, words in energies}) == len(energies), "two levels fill the panel alike")

    # The share stands in the last column, and up to three partners leave room for it.
    for level, columns, table, room in driver.execute_script("""
        return [...document.querySelectorAll('.diagram g.level')].map(g => {
          g.dispatchEvent(new MouseEvent('click', {bubbles: true}));
          const table = document.querySelector('.panel table');
          return [g.querySelector('title').textContent, table.rows[0].cells.length,
                  table.offsetWidth, document.querySelector('.panel .table .scroll').clientWidth];
        });"""):
        expect(columns > 6 or table <= room, f"{level}: {table} px of coefficients in {room} px")

    # A real click, not only an event.
    other = next(level for level in levels if level.get_attribute("aria-pressed") != "true")
    driver.execute_script("arguments[0].scrollIntoView({block: 'center'})", other)
    before, seen = panel(driver), picture(driver)
    webdriver.ActionChains(driver).move_to_element(
        other.find_element(By.CLASS_NAME, "hit")).click().perform()
    settle(driver)
    expect(panel(driver) != before, "a click on a level does not change the panel")
    bare = "The page has no surface"
    expect(picture(driver) != seen or (bare in before and bare in panel(driver)),
           "a click on a level does not change the picture")


def check_rounding(driver):
    """Surfaces are carried with few triangles and rounded by the page: an icosahedron comes near the
    sphere of its corners, and stays closed."""
    phi = (1 + 5 ** 0.5) / 2
    corners = [turn for a in (1, -1) for b in (phi, -phi)
               for turn in ((0, a, b), (a, b, 0), (b, 0, a))]
    corners = [[x / (1 + phi * phi) ** 0.5 for x in corner] for corner in corners]
    near = [[j for j in range(12) if 0.4 < sum(map(float.__mul__, corners[i], corners[j])) < 0.5]
            for i in range(12)]
    faces = [(i, j, k) for i in range(12) for j in near[i] for k in near[i]
             if i < j < k and k in near[j]]
    flat = [x for corner in corners for x in corner]
    rounded = driver.execute_script("""
        const {vertices, normals, triangles} = parted({
          vertices: Float32Array.from(arguments[0]), normals: Float32Array.from(arguments[0]),
          triangles: Uint32Array.from(arguments[1])});
        return [vertices, normals, triangles].map(numbers => [...numbers]);""",
                                    flat, [corner for face in faces for corner in face])
    vertices, normals = ([values[i:i + 3] for i in range(0, len(values), 3)]
                         for values in rounded[:2])
    expect(len(vertices) == 12 + 30 and len(rounded[2]) == 3 * 80, "a triangle is not parted in four")
    edges = {}
    for i in range(0, len(rounded[2]), 3):
        for j in range(3):
            edge = frozenset((rounded[2][i + j], rounded[2][i + (j + 1) % 3]))
            edges[edge] = edges.get(edge, 0) + 1
    expect(len(edges) == 120 and set(edges.values()) == {2}, "the rounded surface is not closed")
    for vertex, normal in zip(vertices[12:], normals[12:]):
        radius = sum(x * x for x in vertex) ** 0.5
        # cos(t) (1 + sin(t)^2 / 2), t half the angle of an edge (cos 2t = 1/sqrt 5), by the cubic's
        # formula; flat it would be cos(t) = 0.851.
        expect(abs(radius - 0.9682) < 1e-3, f"the middle of an edge lies at {radius:.4f} of the radius")
        expect(abs(sum(x * y for x, y in zip(vertex, normal)) / radius - 1) < 1e-5, "a normal leans")


def check_keyboard(driver):
    before = energy_words(driver)
    driver.switch_to.active_element.send_keys(Keys.ARROW_UP)
    up = energy_words(driver)
    if up == before:  # it was the highest
        driver.switch_to.active_element.send_keys(Keys.ARROW_DOWN)
        up = 2 * before - energy_words(driver)
    expect(up > before, "the arrow up does not go up in energy")
    focused = driver.switch_to.active_element
    expect(focused.get_attribute("aria-pressed") == "true", "the focus does not follow the choice")

    canvas = driver.find_element(By.ID, "view")
    settle(driver)
    before = picture(driver)
    canvas.send_keys(Keys.ARROW_LEFT)
    settle(driver)
    expect(picture(driver) != before, "the view does not turn by the keyboard")


def check_sorting(driver):
    column = driver.execute_script("""
        return [...document.querySelectorAll('.table thead th[data-key$="energy_ev"], '
          + '.table thead th[data-key="homo_ev"]')].find(head => head.querySelector('button'));""")
    expect(column is not None, "no column of energies to sort by")
    for direction in (1, -1):
        column.find_element(By.TAG_NAME, "button").send_keys(Keys.ENTER)
        parts = driver.execute_script("""
            const table = arguments[0].closest('table');
            return [...table.tBodies].map(body => [...body.rows]
              .filter(row => !row.classList.contains('separator'))
              .map(row => row.cells[arguments[0].cellIndex].dataset.value).filter(v => v !== '')
              .map(Number));""", column)
        for values in parts:
            expect(values == sorted(values, reverse=direction < 0),
                   f"the column is not sorted: {values}")
        expect(column.get_attribute("aria-sort") ==
               ("ascending" if direction > 0 else "descending"), "aria-sort does not say so")
    expect(sum(len(values) for values in parts) > 1, "nothing to sort")


def check_captions(driver):
    """A short caption stays in one line, however narrow its table, and the table stays narrow."""
    broken = driver.execute_script("""
        return [...document.querySelectorAll('.table caption .caption')].filter(words => {
          const style = getComputedStyle(words);
          const short = words.childElementCount === 0 && words.textContent.length < 40;
          return short && words.getBoundingClientRect().height > 2 * parseFloat(style.fontSize);
        }).map(words => words.textContent);""")
    expect(not broken, f"captions break: {broken}")


def check_print(driver, folder):
    driver.execute_cdp_cmd("Emulation.setEmulatedMedia", {"media": "print"})
    hidden = driver.execute_script("""
        return [...document.querySelectorAll('table, figure svg')]
          .filter(e => e.getBoundingClientRect().height < 1).length;""")
    set_size(driver, PAPER)
    driver.execute_script("dispatchEvent(new Event('beforeprint'))")
    wide = driver.execute_script("""
        return [...document.querySelectorAll('table, figure svg, pre')]
          .filter(e => e.getBoundingClientRect().right > innerWidth + 1)
          .map(e => e.tagName + ' ' + (e.caption?.textContent ?? ''));""")
    driver.execute_script("dispatchEvent(new Event('afterprint'))")
    set_size(driver, DESK)
    driver.execute_cdp_cmd("Emulation.setEmulatedMedia", {"media": ""})
    expect(not wide, f"wider than paper: {wide}")
    expect(hidden == 0, f"{hidden} tables or figures are missing in print")
    if shutil.which("pdftotext") is None:
        return
    import base64
    pdf = os.path.join(folder, "page.pdf")
    with open(pdf, "wb") as file:
        file.write(base64.b64decode(driver.execute_cdp_cmd("Page.printToPDF", {})["data"]))
    text = subprocess.run(["pdftotext", "-layout", pdf, "-"], capture_output=True, text=True).stdout
    plain = re.sub(r"\s+", "", text)
    captions = driver.execute_script(
        "return [...document.querySelectorAll('caption')].map(e => e.textContent)")
    for caption in captions:
        expect(re.sub(r"\s+", "", caption) in plain, f"not in the printed version: {caption}")
    with open(pdf, "rb") as file:
        sheets = re.findall(rb"/MediaBox *\[0 0 ([0-9.]+) ([0-9.]+)\]", file.read())
    sideways = sum(float(width) > float(height) for width, height in sheets)
    wide = len(driver.find_elements(By.CSS_SELECTOR, ".diagram.roomy"))
    expect(sideways == wide, f"{sideways} sheets lie sideways, for {wide} diagrams of many columns")


def check_phone(driver):
    set_size(driver, PHONE)
    settle(driver)
    width = driver.execute_script("return document.documentElement.scrollWidth")
    expect(width <= PHONE[0], f"the page is {width} px wide on a phone of {PHONE[0]} px")
    small = driver.execute_script("""
        return [...document.querySelectorAll('button:not(.sort):not(.copy), nav a')]
          .filter(e => e.getBoundingClientRect().height > 0 && e.getBoundingClientRect().height < 24)
          .map(e => e.textContent);""")
    expect(not small, f"too small for a finger: {small}")
    set_size(driver, DESK)


def luminance(colour):
    """Relative luminance by WCAG 2.1."""
    parts = [int(part) / 255 for part in re.findall(r"\d+", colour)[:3]]
    linear = [p / 12.92 if p <= 0.04045 else ((p + 0.055) / 1.055) ** 2.4 for p in parts]
    return 0.2126 * linear[0] + 0.7152 * linear[1] + 0.0722 * linear[2]


def check_dark(driver):
    colours = """
        const of = (e, name) => getComputedStyle(e)[name];
        return [of(document.body, 'backgroundColor'), of(document.body, 'color'),
                of(document.querySelector('.diagram text'), 'fill')];"""
    for scheme, dark in (("dark", True), ("light", False)):
        driver.execute_cdp_cmd("Emulation.setEmulatedMedia", {
            "features": [{"name": "prefers-color-scheme", "value": scheme}]})
        paper, *inks = [luminance(colour) for colour in driver.execute_script(colours)]
        expect((paper < 0.1) == dark, f"{scheme}: the paper has luminance {paper:.2f}")
        for ink in inks:
            contrast = (max(ink, paper) + 0.05) / (min(ink, paper) + 0.05)
            expect(contrast >= 4.5, f"{scheme}: contrast {contrast:.1f}, below 4.5 (WCAG 2.1, 1.4.3)")
    button = driver.find_element(By.ID, "theme")
    button.send_keys(Keys.ENTER)
    expect(luminance(driver.execute_script(colours)[0]) < 0.1, "the button does not make it dark")
    button.send_keys(Keys.ENTER)


def check(program, job, folder):
    # A name as long as those of real disks: the page states where its input lies.
    far = os.path.join(folder, "a_folder_whose_name_has_no_place_to_break_and_is_wider_than_a_phone")
    os.symlink(os.path.dirname(os.path.abspath(job)), far)
    job = os.path.join(far, os.path.basename(job))
    page = os.path.join(folder, "page.html")
    data = report(program, job, page, "--threads", "1")
    expect(report(program, job, os.path.join(folder, "again.html"), "--threads", "2")
           .replace(b"again.html", b"page.html").replace(b"--threads 2", b"--threads 1") == data,
           "another number of threads changes the page")
    expect(len(data) < LARGEST_PAGE, f"the page has {len(data)} bytes")
    driver = browser()
    try:
        set_size(driver, DESK)
        check_loading(driver, page)
        check_structure(driver)
        check_levels(driver)
        check_rounding(driver)
        check_keyboard(driver)
        check_sorting(driver)
        check_captions(driver)
        check_print(driver, folder)
        check_phone(driver)
        check_dark(driver)
        log = driver.get_log("browser")
        expect(not log, f"the console says: {log}")
    finally:
        driver.quit()
    return f"{len(data) / 1e6:.2f} MB"


def main():
    program, jobs = os.path.abspath(sys.argv[1]), sys.argv[2:]
    if shutil.which("chromium") is None or shutil.which("chromedriver") is None:
        print("skipped: chromium and chromium-driver are not installed")
        return SKIPPED
    return check_each(check, program, jobs)


if __name__ == "__main__":
    sys.exit(main())
