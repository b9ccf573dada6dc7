package isowright.handover;

import isowright.records.Panel;
import isowright.study.Findings;
import isowright.study.FitFindings.Fitted;
import isowright.study.PlanFindings.Planned;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.time.Instant;
import java.util.ArrayList;
import java.util.Date;
import java.util.List;
import java.util.Optional;
import org.apache.commons.compress.archivers.zip.Zip64Mode;
import org.apache.poi.ooxml.POIXMLProperties.CoreProperties;
import org.apache.poi.xssf.streaming.SXSSFWorkbook;

/**
 * The workpapers: a workbook that an auditor can take apart without this program. Records, designs,
 * normal equations, coefficients, standard errors, plans, gaps and allowances stand as formulas
 * over one another, so that changing a number changes what follows from it; beside each live figure
 * stands the one stated in the report, with a cell that says whether they are the same.
 *
 * <p>No macro. Words that begin like a formula stay words. Rows are streamed: the memory needed
 * does not grow with the records.
 *
 * <p>Tested in {@code WorkpapersTest}, which has the workbook recalculated by a spreadsheet where
 * one is installed.
 */
public final class Workpapers {

  /** The file's name. */
  public static final String NAME = "workpapers.xlsx";

  private final SXSSFWorkbook book;
  private final PaperStyles styles;
  private final Findings findings;
  private final List<Paper> papers = new ArrayList<>();
  private final List<String> notes = new ArrayList<>();

  private Workpapers(SXSSFWorkbook book, Findings findings) {
    this.book = book;
    this.styles = PaperStyles.of(book);
    this.findings = findings;
  }

  /**
   * The workbook of a study.
   *
   * @param findings what was found
   * @param rows the rows used; absent where only given technologies were asked
   */
  public static byte[] write(Findings findings, Optional<Panel> rows) {
    SXSSFWorkbook book = new SXSSFWorkbook(SXSSFWorkbook.DEFAULT_WINDOW_SIZE * 100);
    book.setZip64Mode(Zip64Mode.Never); // sizes that the platform's own reader understands
    try (book;
        ByteArrayOutputStream bytes = new ByteArrayOutputStream(1 << 20)) {
      Workpapers papers = new Workpapers(book, findings);
      papers.fill(rows);
      CoreProperties properties = book.getXSSFWorkbook().getProperties().getCoreProperties();
      properties.setTitle(findings.run().title());
      properties.setCreator("Isowright");
      properties.setCreated(Optional.of(Date.from(Instant.EPOCH)));
      properties.setModified(Optional.of(Date.from(Instant.EPOCH)));
      book.setForceFormulaRecalculation(true);
      book.write(bytes);
      return UncalculatedCells.in(bytes.toByteArray());
    } catch (IOException e) {
      throw new UncheckedIOException("the workbook could not be written", e);
    } finally {
      book.dispose();
    }
  }

  private Paper paper(String name, String title) {
    Paper paper = new Paper(book.createSheet(name), styles, title);
    papers.add(paper);
    return paper;
  }

  private void fill(Optional<Panel> rows) {
    Paper guide = new Paper(book.createSheet("Guide"), styles, findings.run().title());
    rows.ifPresent(this::records);
    int number = 0;
    for (Planned plan : findings.plans()) {
      Optional<Fitted> fit =
          findings.fits().stream()
              .filter(f -> f.technology().equals(plan.technology()))
              .findFirst();
      if (fit.isPresent() && PlanPaper.live(plan, fit.get())) {
        number++;
        String title = plan.question() + ", " + plan.technology();
        PlanPaper.write(paper("Plan" + number, title), plan, fit.get());
      } else {
        notes.add(
            "Plan '"
                + plan.question()
                + "', "
                + plan.technology()
                + ": not live (status "
                + plan.status()
                + "); it stands in findings.json.");
      }
    }
    if (findings.fits().stream().anyMatch(fit -> !fit.tests().isEmpty())) {
      ListPapers.tests(paper("Tests", "Tests, each probability from its statistic"), findings);
    }
    if (!findings.reviews().isEmpty()) {
      ListPapers.review(
          paper("Review", "Filed costs beside least costs, " + findings.units().money()), findings);
    }
    findings
        .review()
        .terms()
        .filter(terms -> !findings.review().allowances().isEmpty())
        .ifPresent(
            terms ->
                ListPapers.allowances(
                    paper("Allowance", "From gap to allowance, terms as decided"),
                    findings,
                    terms));
    guide(guide);
  }

  private void records(Panel panel) {
    RecordsPaper records =
        RecordsPaper.write(
            paper("Records", "Records used"),
            panel,
            findings.units().money(),
            findings.units().inputs());
    findings
        .records()
        .ifPresent(read -> ListPapers.setAside(paper("SetAside", "Rows not used"), read));
    int number = 0;
    for (Fitted fit : findings.fits()) {
      number++;
      if (LinearPapers.live(fit, records)) {
        String title = fit.technology() + ", plant effects " + fit.how().plantEffects();
        Paper design = paper("Design" + number, "Design of " + title);
        Paper result = paper("Fit" + number, "Estimate of " + title);
        LinearPapers.write(fit, records, design, result);
      } else if (CurvedPapers.live(fit, records)) {
        Paper design = paper("Design" + number, "Residuals of " + fit.technology());
        Paper result = paper("Fit" + number, "Parameters of " + fit.technology());
        CurvedPapers.write(fit, records, design, result);
      } else {
        notes.add(
            fit.technology()
                + ": its estimate is not worked out here (form, plant effects or time); its"
                + " parameters and covariance stand in findings.json.");
      }
    }
  }

  private void guide(Paper guide) {
    guide.head(2, 0, "What a cell is");
    guide.text(3, 0, "a number of the records, the study or the fit: change it and see");
    guide.input(3, 1, 1);
    guide.text(4, 0, "worked out by this workbook");
    guide.live(4, 1, "1+1");
    guide.text(5, 0, "as stated by Isowright, to compare with");
    guide.stated(5, 1, 3);
    guide.text(6, 0, "whether the two are the same (to 1e-9); all of them together:");
    List<String> verdicts =
        papers.stream().filter(p -> p.checks() > 0).map(Paper::verdictElsewhere).toList();
    guide.live(6, 1, verdicts.isEmpty() ? "TRUE" : "AND(" + String.join(",", verdicts) + ")");
    guide.head(8, 0, "Sheet");
    guide.head(8, 1, "checks hold");
    guide.head(8, 2, "how many checks");
    int row = 9;
    for (Paper paper : papers) {
      guide.text(row, 0, paper.name());
      if (paper.checks() > 0) {
        guide.live(row, 1, paper.verdictElsewhere());
        guide.stated(row, 2, paper.checks());
      }
      row++;
    }
    row++;
    for (String note : notes) {
      guide.text(row++, 0, note);
    }
    guide.text(
        row + 1,
        0,
        "After a number is changed, checks below it turn false: they compare with the run as it was"
            + " made ("
            + findings.run().studySha256()
            + ").");
    guide.width(0, 70);
  }
}
