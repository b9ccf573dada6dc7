package isowright.report;

/** The publications that the method section cites. */
enum Source {
  ACKERBERG(
      "Ackerberg, Caves and Frazer 2015 | Ackerberg, D. A., Caves, K. and Frazer, G. (2015)",
      "Identification Properties of Recent Production Function Estimators",
      "Econometrica 83, 2411–2451"),
  AIGNER(
      "Aigner, Lovell and Schmidt 1977 | Aigner, D., Lovell, C. A. K. and Schmidt, P. (1977)",
      "Formulation and Estimation of Stochastic Frontier Production Function Models",
      "Journal of Econometrics 6, 21–37"),
  ALLEN(
      "Allen 1938 | Allen, R. G. D. (1938)",
      "Mathematical Analysis for Economists",
      "London: Macmillan"),
  AMEMIYA(
      "Amemiya 1971 | Amemiya, T. (1971)",
      "The Estimation of the Variances in a Variance-Components Model",
      "International Economic Review 12, 1–13"),
  ANDERSON_RUBIN(
      "Anderson and Rubin 1949 | Anderson, T. W. and Rubin, H. (1949)",
      "Estimation of the Parameters of a Single Equation in a Complete System of Stochastic"
          + " Equations",
      "Annals of Mathematical Statistics 20, 46–63"),
  ANDREWS(
      "Andrews 2000 | Andrews, D. W. K. (2000)",
      "Inconsistency of the Bootstrap When a Parameter Is on the Boundary of the Parameter Space",
      "Econometrica 68, 399–405"),
  ARROW(
      "Arrow et al. 1961 | Arrow, K. J., Chenery, H. B., Minhas, B. S. and Solow, R. M. (1961)",
      "Capital-Labor Substitution and Economic Efficiency",
      "Review of Economics and Statistics 43, 225–250"),
  BALTAGI_CHANG(
      "Baltagi and Chang 1994 | Baltagi, B. H. and Chang, Y.-J. (1994)",
      "Incomplete Panels: A Comparative Study of Alternative Estimators for the"
          + " Unbalanced One-Way Error Component Regression Model",
      "Journal of Econometrics 62, 67–89"),
  BALTAGI_LI(
      "Baltagi and Li 1990 | Baltagi, B. H. and Li, Q. (1990)",
      "A Lagrange Multiplier Test for the Error Components Model with Incomplete Panels",
      "Econometric Reviews 9, 103–107"),
  BARTEN(
      "Barten 1969 | Barten, A. P. (1969)",
      "Maximum Likelihood Estimation of a Complete System of Demand Equations",
      "European Economic Review 1, 7–73"),
  BASMANN(
      "Basmann 1957 | Basmann, R. L. (1957)",
      "A Generalized Classical Method of Linear Estimation of Coefficients in a Structural"
          + " Equation",
      "Econometrica 25, 77–83"),
  BATTESE_COELLI_1988(
      "Battese and Coelli 1988 | Battese, G. E. and Coelli, T. J. (1988)",
      "Prediction of Firm-Level Technical Efficiencies with a Generalized Frontier Production"
          + " Function and Panel Data",
      "Journal of Econometrics 38, 387–399"),
  BATTESE_COELLI_1992(
      "Battese and Coelli 1992 | Battese, G. E. and Coelli, T. J. (1992)",
      "Frontier Production Functions, Technical Efficiency and Panel Data: With Application to"
          + " Paddy Farmers in India",
      "Journal of Productivity Analysis 3, 153–169"),
  BELL(
      "Bell and McCaffrey 2002 | Bell, R. M. and McCaffrey, D. F. (2002)",
      "Bias Reduction in Standard Errors for Linear Regression with Multi-Stage Samples",
      "Survey Methodology 28, 169–181"),
  BELSLEY(
      "Belsley, Kuh and Welsch 1980 | Belsley, D. A., Kuh, E. and Welsch, R. E. (1980)",
      "Regression Diagnostics",
      "New York: Wiley"),
  BERNDT(
      "Berndt and Wood 1975 | Berndt, E. R. and Wood, D. O. (1975)",
      "Technology, Prices, and the Derived Demand for Energy",
      "Review of Economics and Statistics 57, 259–268"),
  BLACKORBY(
      "Blackorby and Russell 1989 | Blackorby, C. and Russell, R. R. (1989)",
      "Will the Real Elasticity of Substitution Please Stand Up?",
      "American Economic Review 79, 882–888"),
  BREUSCH(
      "Breusch and Pagan 1980 | Breusch, T. S. and Pagan, A. R. (1980)",
      "The Lagrange Multiplier Test and Its Applications to Model Specification in"
          + " Econometrics",
      "Review of Economic Studies 47, 239–253"),
  BROWN_CHRISTENSEN(
      "Brown and Christensen 1981 | Brown, R. S. and Christensen, L. R. (1981)",
      "Estimating Elasticities of Substitution in a Model of Partial Static Equilibrium",
      "in Berndt, E. R. and Field, B. C. (eds), Modeling and Measuring Natural Resource"
          + " Substitution, Cambridge: MIT Press, 209–229"),
  CAMERON(
      "Cameron and Miller 2015 | Cameron, A. C. and Miller, D. L. (2015)",
      "A Practitioner’s Guide to Cluster-Robust Inference",
      "Journal of Human Resources 50, 317–372"),
  CAMERON_BOOTSTRAP(
      "Cameron, Gelbach and Miller 2008 | Cameron, A. C., Gelbach, J. B. and Miller, D. L. (2008)",
      "Bootstrap-Based Improvements for Inference with Clustered Errors",
      "Review of Economics and Statistics 90, 414–427"),
  CAMERON_GELBACH(
      "Cameron, Gelbach and Miller 2011 | Cameron, A. C., Gelbach, J. B. and Miller, D. L. (2011)",
      "Robust Inference with Multiway Clustering",
      "Journal of Business and Economic Statistics 29, 238–249"),
  CAVES(
      "Caves, Christensen and Swanson 1981",
      "Caves, D. W., Christensen, L. R. and Swanson, J. A. (1981)",
      "Productivity Growth, Scale Economies, and Capacity Utilization in U.S. Railroads, 1955–74",
      "American Economic Review 71, 994–1002"),
  DIEWERT_WALES(
      "Diewert and Wales 1987 | Diewert, W. E. and Wales, T. J. (1987)",
      "Flexible Functional Forms and Global Curvature Conditions",
      "Econometrica 55, 43–68"),
  NEARY_ROBERTS(
      "Neary and Roberts 1980 | Neary, J. P. and Roberts, K. W. S. (1980)",
      "The Theory of Household Behaviour under Rationing",
      "European Economic Review 13, 25–42"),
  RYAN_WALES(
      "Ryan and Wales 2000 | Ryan, D. L. and Wales, T. J. (2000)",
      "Imposing Local Concavity in the Translog and Generalized Leontief Cost Functions",
      "Economics Letters 67, 253–260"),
  BAUMOL_PANZAR_WILLIG(
      "Baumol, Panzar and Willig 1982 | Baumol, W. J., Panzar, J. C. and Willig, R. D. (1982)",
      "Contestable Markets and the Theory of Industry Structure",
      "Harcourt Brace Jovanovich"),
  CHRISTENSEN_GREENE(
      "Christensen and Greene 1976 | Christensen, L. R. and Greene, W. H. (1976)",
      "Economies of Scale in U.S. Electric Power Generation",
      "Journal of Political Economy 84, 655–676"),
  CHOW(
      "Chow 1960 | Chow, G. C. (1960)",
      "Tests of Equality between Sets of Coefficients in Two Linear Regressions",
      "Econometrica 28, 591–605"),
  CHRISTENSEN(
      "Christensen, Jorgenson and Lau 1973",
      "Christensen, L. R., Jorgenson, D. W. and Lau, L. J. (1973)",
      "Transcendental Logarithmic Production Frontiers",
      "Review of Economics and Statistics 55, 28–45"),
  COBB_DOUGLAS(
      "Cobb and Douglas 1928 | Cobb, C. W. and Douglas, P. H. (1928)",
      "A Theory of Production",
      "American Economic Review 18, Supplement, 139–165"),
  COOK(
      "Cook 1977 | Cook, R. D. (1977)",
      "Detection of Influential Observation in Linear Regression",
      "Technometrics 19, 15–18"),
  DAVISON(
      "Davison and Hinkley 1997 | Davison, A. C. and Hinkley, D. V. (1997)",
      "Bootstrap Methods and their Application",
      "Cambridge: Cambridge University Press"),
  DRISCOLL(
      "Driscoll and Kraay 1998 | Driscoll, J. C. and Kraay, A. C. (1998)",
      "Consistent Covariance Matrix Estimation with Spatially Dependent Panel Data",
      "Review of Economics and Statistics 80, 549–560"),
  DIEWERT(
      "Diewert 1971 | Diewert, W. E. (1971)",
      "An Application of the Shephard Duality Theorem: A Generalized Leontief Production Function",
      "Journal of Political Economy 79, 481–507"),
  DUAN(
      "Duan 1983 | Duan, N. (1983)",
      "Smearing Estimate: A Nonparametric Retransformation Method",
      "Journal of the American Statistical Association 78, 605–610"),
  EFRON(
      "Efron 1987 | Efron, B. (1987)",
      "Better Bootstrap Confidence Intervals",
      "Journal of the American Statistical Association 82, 171–185"),
  FARRELL(
      "Farrell 1957 | Farrell, M. J. (1957)",
      "The Measurement of Productive Efficiency",
      "Journal of the Royal Statistical Society, Series A 120, 253–290"),
  GALLANT(
      "Gallant and Golub 1984 | Gallant, A. R. and Golub, G. H. (1984)",
      "Imposing Curvature Restrictions on Flexible Functional Forms",
      "Journal of Econometrics 26, 295–321"),
  GOLDFARB(
      "Goldfarb and Idnani 1983 | Goldfarb, D. and Idnani, A. (1983)",
      "A Numerically Stable Dual Method for Solving Strictly Convex Quadratic Programs",
      "Mathematical Programming 27, 1–33"),
  GUM(
      "JCGM 2008 | JCGM (2008)",
      "Evaluation of Measurement Data: Guide to the Expression of Uncertainty in Measurement",
      "JCGM 100:2008"),
  HALL(
      "Hall and Jorgenson 1967 | Hall, R. E. and Jorgenson, D. W. (1967)",
      "Tax Policy and Investment Behavior",
      "American Economic Review 57, 391–414"),
  HANOCH(
      "Hanoch 1975 | Hanoch, G. (1975)",
      "The Elasticity of Scale and the Shape of Average Costs",
      "American Economic Review 65, 492–497"),
  HANSEN(
      "Hansen 1982 | Hansen, L. P. (1982)",
      "Large Sample Properties of Generalized Method of Moments Estimators",
      "Econometrica 50, 1029–1054"),
  HAUSMAN(
      "Hausman 1978 | Hausman, J. A. (1978)",
      "Specification Tests in Econometrics",
      "Econometrica 46, 1251–1271"),
  HICKS("Hicks 1932", "Hicks, J. R. (1932)", "The Theory of Wages", "London: Macmillan"),
  HORRACE(
      "Horrace and Schmidt 1996 | Horrace, W. C. and Schmidt, P. (1996)",
      "Confidence Statements for Efficiency Estimates from Stochastic Frontier Models",
      "Journal of Productivity Analysis 7, 257–282"),
  HOTELLING(
      "Hotelling 1931 | Hotelling, H. (1931)",
      "The Generalization of Student’s Ratio",
      "Annals of Mathematical Statistics 2, 360–378"),
  HOTHORN(
      "Hothorn, Bretz and Westfall 2008 | Hothorn, T., Bretz, F. and Westfall, P. (2008)",
      "Simultaneous Inference in General Parametric Models",
      "Biometrical Journal 50, 346–363"),
  HUBER("Huber 1981", "Huber, P. J. (1981)", "Robust Statistics", "New York: Wiley"),
  JONDROW(
      "Jondrow et al. 1982 | Jondrow, J., Lovell, C. A. K., Materov, I. S. and Schmidt, P. (1982)",
      "On the Estimation of Technical Inefficiency in the Stochastic Frontier Production Function"
          + " Model",
      "Journal of Econometrics 19, 233–238"),
  JORGENSON(
      "Jorgenson 1963 | Jorgenson, D. W. (1963)",
      "Capital Theory and Investment Behavior",
      "American Economic Review 53 (2), 247–259"),
  JUDGE(
      "Judge and Takayama 1966 | Judge, G. G. and Takayama, T. (1966)",
      "Inequality Restrictions in Regression Analysis",
      "Journal of the American Statistical Association 61, 166–181"),
  KLUMP(
      "Klump and de La Grandville 2000 | Klump, R. and de La Grandville, O. (2000)",
      "Economic Growth and the Elasticity of Substitution: Two Theorems and Some Suggestions",
      "American Economic Review 90, 282–291"),
  KODDE(
      "Kodde and Palm 1986 | Kodde, D. A. and Palm, F. C. (1986)",
      "Wald Criteria for Jointly Testing Equality and Inequality Restrictions",
      "Econometrica 54, 1243–1248"),
  KOPP(
      "Kopp and Diewert 1982 | Kopp, R. J. and Diewert, W. E. (1982)",
      "The Decomposition of Frontier Cost Function Deviations into Measures of Technical and"
          + " Allocative Efficiency",
      "Journal of Econometrics 19, 319–331"),
  DE_LA_GRANDVILLE(
      "de La Grandville 1989 | de La Grandville, O. (1989)",
      "In Quest of the Slutsky Diamond",
      "American Economic Review 79, 468–481"),
  LEVINSOHN(
      "Levinsohn and Petrin 2003 | Levinsohn, J. and Petrin, A. (2003)",
      "Estimating Production Functions Using Inputs to Control for Unobservables",
      "Review of Economic Studies 70, 317–341"),
  LIANG(
      "Liang and Zeger 1986 | Liang, K.-Y. and Zeger, S. L. (1986)",
      "Longitudinal Data Analysis Using Generalized Linear Models",
      "Biometrika 73, 13–22"),
  MACKINNON(
      "MacKinnon and White 1985 | MacKinnon, J. G. and White, H. (1985)",
      "Some Heteroskedasticity-Consistent Covariance Matrix Estimators with Improved Finite Sample"
          + " Properties",
      "Journal of Econometrics 29, 305–325"),
  MACKINNON_GUIDE(
      "MacKinnon, Nielsen and Webb 2023 | MacKinnon, J. G., Nielsen, M. Ø. and Webb, M. D. (2023)",
      "Cluster-Robust Inference: A Guide to Empirical Practice",
      "Journal of Econometrics 232, 272–299"),
  MARSCHAK(
      "Marschak and Andrews 1944 | Marschak, J. and Andrews, W. H. (1944)",
      "Random Simultaneous Equations and the Theory of Production",
      "Econometrica 12, 143–205"),
  MARSHALL(
      "Marshall and Spiegelhalter 1998 | Marshall, E. C. and Spiegelhalter, D. J. (1998)",
      "League Tables of In Vitro Fertilisation Clinics: How Confident Can We Be About the"
          + " Rankings?",
      "British Medical Journal 316, 1701–1705"),
  MONTIEL(
      "Montiel Olea and Pflueger 2013 | Montiel Olea, J. L. and Pflueger, C. (2013)",
      "A Robust Test for Weak Instruments",
      "Journal of Business and Economic Statistics 31, 358–369"),
  MEEUSEN(
      "Meeusen and van den Broeck 1977 | Meeusen, W. and van den Broeck, J. (1977)",
      "Efficiency Estimation from Cobb-Douglas Production Functions with Composed Error",
      "International Economic Review 18, 435–444"),
  MUNDLAK(
      "Mundlak 1978 | Mundlak, Y. (1978)",
      "On the Pooling of Time Series and Cross Section Data",
      "Econometrica 46, 69–85"),
  NEWEY(
      "Newey and West 1987 | Newey, W. K. and West, K. D. (1987)",
      "A Simple, Positive Semi-Definite, Heteroskedasticity and Autocorrelation Consistent"
          + " Covariance Matrix",
      "Econometrica 55, 703–708"),
  NEWEY_LAGS(
      "Newey and West 1994 | Newey, W. K. and West, K. D. (1994)",
      "Automatic Lag Selection in Covariance Matrix Estimation",
      "Review of Economic Studies 61, 631–653"),
  SCHMIDT_SICKLES(
      "Schmidt and Sickles 1984 | Schmidt, P. and Sickles, R. C. (1984)",
      "Production Frontiers and Panel Data",
      "Journal of Business and Economic Statistics 2, 367–374"),
  SHEPHARD(
      "Shephard 1953 | Shephard, R. W. (1953)",
      "Cost and Production Functions",
      "Princeton: Princeton University Press"),
  STAIGER(
      "Staiger and Stock 1997 | Staiger, D. and Stock, J. H. (1997)",
      "Instrumental Variables Regression with Weak Instruments",
      "Econometrica 65, 557–586"),
  SWAMY(
      "Swamy and Arora 1972 | Swamy, P. A. V. B. and Arora, S. S. (1972)",
      "The Exact Finite Sample Properties of the Estimators of Coefficients in the"
          + " Error Components Regression Models",
      "Econometrica 40, 261–275"),
  OLLEY(
      "Olley and Pakes 1996 | Olley, G. S. and Pakes, A. (1996)",
      "The Dynamics of Productivity in the Telecommunications Equipment Industry",
      "Econometrica 64, 1263–1297"),
  SANDERSON(
      "Sanderson and Windmeijer 2016 | Sanderson, E. and Windmeijer, F. (2016)",
      "A Weak Instrument F-Test in Linear IV Models with Multiple Endogenous Variables",
      "Journal of Econometrics 190, 212–221"),
  SARGAN(
      "Sargan 1958 | Sargan, J. D. (1958)",
      "The Estimation of Economic Relationships Using Instrumental Variables",
      "Econometrica 26, 393–415"),
  SATO(
      "Sato 1967 | Sato, K. (1967)",
      "A Two-Level Constant-Elasticity-of-Substitution Production Function",
      "Review of Economic Studies 34, 201–218"),
  UZAWA(
      "Uzawa 1962 | Uzawa, H. (1962)",
      "Production Functions with Constant Elasticities of Substitution",
      "Review of Economic Studies 29, 291–299"),
  WALDMAN(
      "Waldman 1982 | Waldman, D. M. (1982)",
      "A Stationary Point for the Stochastic Frontier Likelihood",
      "Journal of Econometrics 18, 275–279"),
  WALLACE(
      "Wallace and Hussain 1969 | Wallace, T. D. and Hussain, A. (1969)",
      "The Use of Error Components Models in Combining Cross Section with Time Series Data",
      "Econometrica 37, 55–72"),
  WEBB(
      "Webb 2023 | Webb, M. D. (2023)",
      "Reworking Wild Bootstrap-Based Inference for Clustered Errors",
      "Canadian Journal of Economics 56, 839–858"),
  WOOLDRIDGE(
      "Wooldridge 2002 | Wooldridge, J. M. (2002)",
      "Econometric Analysis of Cross Section and Panel Data",
      "Cambridge, Massachusetts: MIT Press"),
  WOOLDRIDGE_JOINT(
      "Wooldridge 2009 | Wooldridge, J. M. (2009)",
      "On Estimating Firm-Level Production Functions Using Proxy Variables to Control for"
          + " Unobservables",
      "Economics Letters 104, 112–114"),
  WU(
      "Wu 1973 | Wu, D.-M. (1973)",
      "Alternative Tests of Independence between Stochastic Regressors and Disturbances",
      "Econometrica 41, 733–750"),
  ZELLNER(
      "Zellner 1962 | Zellner, A. (1962)",
      "An Efficient Method of Estimating Seemingly Unrelated Regressions and Tests for"
          + " Aggregation Bias",
      "Journal of the American Statistical Association 57, 348–368");

  private final String cited;
  private final String authors;
  private final String title;
  private final String place;

  Source(String cited, String authors, String title, String place) {
    this.cited = cited;
    this.authors = authors;
    this.title = title;
    this.place = place;
  }

  /** How it is cited in a sentence, and authors and year, with a bar between. */
  Source(String names, String title, String place) {
    this(
        names.substring(0, names.indexOf(" | ")),
        names.substring(names.indexOf(" | ") + 3),
        title,
        place);
  }

  /** How it is cited in a sentence. */
  String cited() {
    return cited;
  }

  /** Authors and year. */
  String authors() {
    return authors;
  }

  /** The entry in the list of references. */
  Text entry() {
    String end = title.endsWith("?") ? " " : ". ";
    return Text.of(authors + ", ").thenEmphasis(title).then(end + place + ".");
  }
}
